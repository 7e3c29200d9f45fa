/**
 * One self-contained HTML page of the runs of a replay: {@link dev.estimation.benchmarks.page.ReplayPage} gathers what is
 * drawn, thinned where logs are long, as a block of JSON; a script of the page's own draws it with a chart library that
 * stands in the page too. The page loads nothing and forbids itself to.
 */
package dev.estimation.benchmarks.page;
