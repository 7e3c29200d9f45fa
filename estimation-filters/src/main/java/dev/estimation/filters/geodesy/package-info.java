/**
 * Places on the Earth: geodetic, Earth-fixed and local coordinates on the ellipsoid of WGS 84. Conversions fill
 * plain arrays and allocate nothing; arrays may be the same.
 *
 * <table>
 * <caption>Coordinates, three numbers each</caption>
 * <tr><th>name</th><th>numbers</th><th>units</th></tr>
 * <tr><td>geodetic</td><td>latitude (north positive), longitude in [-pi, pi) (east positive), height above the ellipsoid</td><td>rad, rad, m</td></tr>
 * <tr><td>Earth-fixed</td><td>x through latitude 0 and longitude 0, y through 90 degrees east, z through the north pole; origin at the Earth's
 * centre</td><td>m</td></tr>
 * <tr><td>local</td><td>east, north, up from an origin; up is the outward normal of the ellipsoid there</td><td>m</td></tr>
 * </table>
 *
 * <p>{@link dev.estimation.filters.geodesy.Wgs84} goes between the first two, {@link
 * dev.estimation.filters.geodesy.EastNorthUp} between the last two. Heights are above the ellipsoid, not above the sea: the
 * two differ by up to about 100 m (common practice), and no table of that difference is here. Nor are datums and plate motion.
 *
 * <p><b>Caution.</b> Not certified for any use. In navigation, flight and wherever a position can hurt someone: keep to the rules of the domain and its licensed
 * practice, keep an independent check, and let a qualified person decide.
 */
package dev.estimation.filters.geodesy;
