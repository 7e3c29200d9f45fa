(function () {
  'use strict';

  // Colours that remain distinct to colour-blind readers: Okabe and Ito 2008, Color Universal Design.
  const COLOURS = ['#0072B2', '#D55E00', '#009E73', '#CC79A7', '#E69F00', '#56B4E9'];
  const ON_DARK = {'#0072B2': '#F0E442'}; // their yellow where their blue is too dark
  const SYMBOLS = ['circle', 'rect', 'triangle', 'diamond', 'roundRect', 'pin'];
  const DASHES = ['solid', 'dashed', 'dotted'];
  const CHI2_95_PLANE = -2 * Math.log(0.05); // chi-square, 2 degrees of freedom, 95 %
  const VERDICTS = [
    {name: 'below: too cautious', colour: '#56B4E9', symbol: 'path://M0,0 L10,0 L5,9 Z'},
    {name: 'inside', colour: '#009E73', symbol: 'circle'},
    {name: 'above: overconfident', colour: '#D55E00', symbol: 'triangle'},
    {name: 'gated', colour: '#CC79A7', symbol: 'diamond'},
    {name: 'skipped', colour: '#E69F00', symbol: 'rect'}
  ];
  const MOST_ELLIPSES = 24;
  const faults = [];
  const charts = {};
  const counts = {};
  const byId = id => document.getElementById(id);
  window.addEventListener('error', event => { faults.push(String(event.message)); probe(); });
  document.addEventListener('securitypolicyviolation', event => { faults.push('refused ' + event.blockedURI); probe(); });

  const data = JSON.parse(byId('data').textContent);
  const view = {
    variant: 0, hidden: new Set(), detail: '', measure: 'rmse', place: 0, axes: 0, plane: 0, extent: 'most', component: 0,
    innovation: 0, spread: 'most', side: 'rest', sort: null, descending: false, theme: 'auto', printing: false
  };

  // ---- what is shown

  const variant = () => data.variants[view.variant];
  const runs = () => variant().runs.filter(run => run.row);
  const shown = () => runs().filter(run => !view.hidden.has(run.name));
  const detail = () => runs().find(run => run.name === view.detail) || runs()[0];
  const hasTruth = () => runs().some(run => run.row.rmse !== undefined);

  function allNames() {
    return [...new Set(data.variants.flatMap(each => each.runs.map(run => run.name)))];
  }
  const names = allNames();
  const isDark = () => document.documentElement.dataset.theme === 'dark';

  function look(name) {
    const i = names.indexOf(name);
    const round = Math.floor(i / COLOURS.length);
    const colour = COLOURS[i % COLOURS.length];
    return {colour: isDark() ? ON_DARK[colour] || colour : colour, symbol: SYMBOLS[i % SYMBOLS.length], dash: DASHES[round % DASHES.length]};
  }

  // ---- small helpers

  function number(value, digits) {
    if (value === null || value === undefined) return '–';
    if (value === 0) return '0';
    const size = Math.abs(value);
    return size >= 1e6 || size < 1e-3 ? value.toExponential(2).replace(/\.?0+e/, 'e').replace('e+', 'e') : String(Number(value.toPrecision(digits || 4)));
  }
  const titled = (quantity, before) => (before || '') + quantity.name + (quantity.unit ? ' (' + quantity.unit + ')' : '');
  const colourOf = name => getComputedStyle(document.documentElement).getPropertyValue(name).trim();

  function element(tag, text, attributes) {
    const made = document.createElement(tag);
    if (text !== undefined) made.textContent = text;
    Object.entries(attributes || {}).forEach(([key, value]) => made.setAttribute(key, value));
    return made;
  }

  function swatch(name) {
    const svg = document.createElementNS('http://www.w3.org/2000/svg', 'svg');
    const line = document.createElementNS('http://www.w3.org/2000/svg', 'line');
    const dash = {solid: '', dashed: '6 3', dotted: '2 3'}[look(name).dash];
    const attributes = {x1: 0, y1: 6, x2: 26, y2: 6, stroke: look(name).colour, 'stroke-width': 4, 'stroke-dasharray': dash};
    Object.entries(attributes).forEach(([key, value]) => line.setAttribute(key, value));
    svg.setAttribute('class', 'swatch');
    svg.setAttribute('viewBox', '0 0 26 12');
    svg.setAttribute('aria-hidden', 'true');
    svg.append(line);
    return svg;
  }

  function fill(select, texts, chosen) {
    const box = byId(select);
    box.replaceChildren(...texts.map((text, i) => element('option', text, {value: i})));
    box.value = String(chosen);
    box.parentElement.hidden = texts.length < 2;
  }

  function note(id, ...sentences) {
    byId(id + '-note').textContent = sentences.filter(Boolean).join(' ');
  }
  const thinned = (stride, what) => stride > 1 ? 'Thinned: one ' + what + ' in ' + stride + ' is drawn.' : '';
  const zip = (xs, ys) => xs.map((x, i) => [x, ys[i]]);

  // ---- charts

  function axis(name, more) {
    const style = {
      type: 'value', name: name, nameLocation: 'middle', nameGap: 30, scale: true,
      nameTextStyle: {color: colourOf('--ink')},
      axisLabel: {color: colourOf('--faint'), hideOverlap: true, formatter: value => number(value, 6)},
      axisLine: {show: true, onZero: false, lineStyle: {color: colourOf('--faint')}},
      splitLine: {lineStyle: {color: colourOf('--rule'), opacity: 0.6}},
      minorSplitLine: {show: false}
    };
    return Object.assign(style, more || {});
  }
  const upright = (name, more) => axis(name, Object.assign({nameGap: 58}, more || {}));
  const TIME = () => axis('time since the start (s)', {min: 0, max: 'dataMax', axisLabel: {color: colourOf('--faint'), hideOverlap: true, showMaxLabel: false, formatter: value => number(value, 6)}});
  const ZOOM_X = [{type: 'inside', xAxisIndex: 0, zoomOnMouseWheel: 'ctrl', moveOnMouseWheel: false, filterMode: 'none'}];
  const ZOOM_XY = ZOOM_X.concat([{type: 'inside', yAxisIndex: 0, zoomOnMouseWheel: 'ctrl', moveOnMouseWheel: false, filterMode: 'none'}]);

  function draw(id, option) {
    const box = byId(id);
    if (!charts[id]) charts[id] = echarts.init(box, null, {renderer: 'canvas', devicePixelRatio: Math.max(2, window.devicePixelRatio || 1)});
    const frame = {
      animation: false, backgroundColor: 'transparent',
      textStyle: {color: colourOf('--ink'), fontFamily: 'system-ui, sans-serif'},
      grid: {left: 78, right: 22, top: 58, bottom: 52},
      legend: {type: 'scroll', show: Boolean(option.legendNames), top: 2, left: 0, right: 100, width: Math.max(80, box.clientWidth - 110), textStyle: {color: colourOf('--ink')}, pageTextStyle: {color: colourOf('--ink')},
        pageIconColor: colourOf('--accent'), data: option.legendNames},
      tooltip: {confine: true, backgroundColor: colourOf('--card'), borderColor: colourOf('--rule'), textStyle: {color: colourOf('--ink')}},
      toolbox: {right: 0, top: 0, itemSize: 14, iconStyle: {borderColor: colourOf('--faint')},
        feature: {dataZoom: {filterMode: 'none', title: {zoom: 'Zoom to a box', back: 'Undo zoom'}, brushStyle: {opacity: 0.2}}, restore: {title: 'Restore'},
          saveAsImage: {title: 'Save', name: id, backgroundColor: colourOf('--card')}}}
    };
    ['tooltip', 'grid', 'legend'].forEach(key => { if (option[key]) option[key] = Object.assign(frame[key], option[key]); });
    const whole = Object.assign(frame, option);
    delete whole.legendNames;
    charts[id].setOption(whole, {notMerge: true});
    counts[id] = whole.series.map(one => one.data.length);
    box.setAttribute('aria-label', byId(id + '-card').querySelector('h2').textContent);
  }

  function show(id, wanted) {
    byId(id + '-card').hidden = !wanted;
    if (!wanted) {
      if (charts[id]) { charts[id].dispose(); delete charts[id]; }
      delete counts[id];
    }
    return wanted;
  }

  // ---- 1: accuracy against cost

  const MEASURES = {
    rmse: {title: 'position error, rms (m)', of: row => row.rmse},
    nees: {title: 'NEES off by a factor of', of: row => row.nees > 0 ? Math.max(row.nees / row.degrees, row.degrees / row.nees) : undefined}
  };

  function paretoFront(points) {
    const sorted = [...points].sort((a, b) => a.x - b.x || a.y - b.y);
    let best = Infinity;
    return sorted.filter(point => { const better = point.y < best; best = Math.min(best, point.y); return better; });
  }

  function drawTradeoff() {
    if (!show('tradeoff', hasTruth())) return;
    const measure = MEASURES[view.measure];
    const points = shown().map(run => ({run: run, x: run.row.evaluations, y: measure.of(run.row)})).filter(p => p.x > 0 && p.y > 0);
    const front = paretoFront(points);
    const ends = [spanOf(points.map(p => p.x), 2.2), spanOf(points.map(p => p.y), 1.15)];
    const labels = labelsOf(points, ends);
    const series = points.map(point => ({
      type: 'scatter', name: point.run.name, symbol: look(point.run.name).symbol, symbolSize: 15,
      itemStyle: {color: look(point.run.name).colour, borderColor: colourOf('--ink'), borderWidth: front.includes(point) ? 2.5 : 0},
      label: {show: labels.has(point), formatter: () => labels.get(point).join('\n'), position: labels.has(point) && labels.get(point).length > 1 ? 'top' : 'right', color: colourOf('--ink'), fontSize: 11, lineHeight: 14},
      data: [[point.x, point.y]]
    }));
    series.push({type: 'line', name: 'Pareto front', step: 'end', symbol: 'none', z: 1, data: front.map(p => [p.x, p.y]),
      lineStyle: {color: colourOf('--faint'), type: 'dashed', width: 1.5}, itemStyle: {color: colourOf('--faint')}});
    draw('tradeoff', {
      series: series, legendNames: ['Pareto front'],
      xAxis: axis('evaluations a step', Object.assign({type: 'log'}, ends[0])),
      yAxis: upright(measure.title, Object.assign({type: 'log'}, ends[1])),
      dataZoom: ZOOM_XY,
      tooltip: {trigger: 'item', formatter: hit => hit.seriesType === 'scatter' ? hover(hit.seriesName) : 'Pareto front'}
    });
    note('tradeoff', 'Thick rims mark the Pareto front: no other method drawn here is both cheaper and better. Jacobians are not counted as evaluations; hover tells them.',
      view.measure === 'nees' ? 'NEES off by a factor: mean NEES over its degrees of freedom, or the inverse if that is below 1; 1 is honest.' : '',
      runs().some(run => run.smoothed) ? 'Smoothed tracks ask no model and are not drawn.' : '');
  }

  /** The ends of a logarithmic axis: factors of 1, 2 and 5, or, where values lie close together, some room around them. */
  function spanOf(values, room) {
    if (!values.length) return {};
    const low = Math.min(...values), high = Math.max(...values);
    if (high / low < 2) return {min: Number((low / room).toPrecision(3)), max: Number((high * room).toPrecision(3))};
    const marks = [];
    for (let power = Math.floor(Math.log10(low)) - 1; power <= Math.log10(high * room) + 1; power++) marks.push(...[1, 2, 5].map(n => Number((n * Math.pow(10, power)).toPrecision(1))));
    return {min: Math.max(...marks.filter(mark => mark < low * 0.97)), max: Math.min(...marks.filter(mark => mark > high * room))};
  }

  /** One label for points that lie together, at the first of them. */
  function labelsOf(points, ends) {
    const share = (value, end) => Math.log(value / end.min) / Math.log(end.max / end.min);
    const labels = new Map();
    [...points].sort((a, b) => b.y - a.y).forEach(point => {
      const near = [...labels.keys()].find(other => Math.abs(share(point.x, ends[0]) - share(other.x, ends[0])) < 0.3 && Math.abs(share(point.y, ends[1]) - share(other.y, ends[1])) < 0.07);
      if (near && point.x === near.x) labels.get(near).push(point.run.name); else labels.set(point, [point.run.name]);
    });
    return labels;
  }

  function hover(name) {
    const row = runs().find(run => run.name === name).row;
    const lines = [escapeHtml(name), 'position error, rms ' + number(row.rmse) + ' m', 'largest ' + number(row.max) + ' m',
      'NEES ' + number(row.nees) + ' (honest: ' + row.degrees + ')', number(row.evaluations) + ' evaluations a step', number(row.jacobians) + ' Jacobians a step'];
    return lines.join('<br>');
  }
  const escapeHtml = text => text.replace(/[&<>"']/g, c => '&#' + c.charCodeAt(0) + ';');

  // ---- 2: the cloud

  function pairs(count) {
    const all = [];
    for (let i = 0; i < count; i++) for (let j = i + 1; j < count; j++) all.push([i, j]);
    return all;
  }

  function ellipse(centre, xx, xy, yy, points) {
    const size = Math.sqrt(CHI2_95_PLANE);
    const a = Math.sqrt(Math.max(0, xx));
    const b = a > 0 ? xy / a : 0;
    const c = Math.sqrt(Math.max(0, yy - b * b));
    return Array.from({length: points + 1}, (unused, i) => {
      const angle = 2 * Math.PI * i / points;
      const u = size * Math.cos(angle), v = size * Math.sin(angle);
      return [centre[0] + a * u, centre[1] + b * u + c * v];
    });
  }

  function drawCloud() {
    const cloud = variant().clouds[view.place];
    if (!show('cloud', cloud !== undefined)) return;
    const methods = cloud.methods.filter(method => !view.hidden.has(method.name));
    const side = sideOf(cloud, methods);
    if (cloud.axes.length === 1) drawHistogram(side); else drawPlane(side);
    const where = 'Before the ' + (cloud.model === 'motion' ? 'prediction' : 'update') + ' of step ' + cloud.step + ', ' + number(cloud.t)
      + ' s after the start, in the run of ' + variant().cloudsFrom + ': ';
    note('cloud', where + cloud.samples.length + ' draws of the state sent through the ' + (cloud.model === 'motion' ? 'motion' : 'sensor')
      + ' model, as differences from their mean' + (view.side === 'rest' ? ', less what a straight line in the state explains of them, plus noise: what a filter must know to weigh a measurement.' : ', no noise added.'),
      'True moments are those of ' + cloud.draws + ' draws. Largest error of linearisation there, relative, noise counted: ' + number(cloud.linearisationError, 3) + '.',
      cloud.methods.some(method => method.iterated) ? 'Iterated methods are shown as they begin, before they iterate.' : '',
      cloud.axes.length === 1 ? 'Curves are normal densities.' : 'Ellipses hold 95 % if normal.');
  }

  /** The side of a cloud that is looked at. */
  function sideOf(cloud, methods) {
    const rest = view.side === 'rest';
    return {axes: cloud.axes, samples: rest ? cloud.rests : cloud.samples, covariance: rest ? cloud.restCovariance : cloud.covariance,
      methods: methods.map(method => ({name: method.name, mean: method.mean, covariance: rest ? method.restCovariance : method.covariance}))};
  }

  function drawPlane(cloud) {
    const [i, j] = pairs(cloud.axes.length)[view.axes] || [0, 1];
    const at = (mean, P) => ellipse([mean[i], mean[j]], P[i][i], P[i][j], P[j][j], 72);
    const series = [{type: 'scatter', name: 'draws', symbolSize: 3, itemStyle: {color: colourOf('--faint'), opacity: 0.45}, large: false, silent: true,
      data: cloud.samples.map(sample => [sample[i], sample[j]])}];
    series.push({type: 'line', name: 'true', symbol: 'none', lineStyle: {color: colourOf('--ink'), width: 3.5}, itemStyle: {color: colourOf('--ink')},
      data: at(cloud.axes.map(() => 0), cloud.covariance)});
    cloud.methods.forEach(method => series.push({type: 'line', name: method.name, symbol: 'none', lineStyle: lineOf(method.name, 2),
      itemStyle: {color: look(method.name).colour}, data: at(method.mean, method.covariance)}));
    draw('cloud', {series: series, legendNames: ['draws', 'true'], xAxis: axis(titled(cloud.axes[i]) + ' from the mean'), yAxis: upright(titled(cloud.axes[j]) + ' from the mean'),
      dataZoom: ZOOM_XY, tooltip: {trigger: 'item', formatter: hit => escapeHtml(hit.seriesName)}});
  }

  const lineOf = (name, width) => ({color: look(name).colour, width: width, type: look(name).dash});

  function drawHistogram(cloud) {
    const values = cloud.samples.map(sample => sample[0]);
    const low = Math.min(...values), high = Math.max(...values), bins = 40, width = (high - low) / bins || 1;
    const heights = new Array(bins).fill(0);
    values.forEach(value => { heights[Math.min(bins - 1, Math.floor((value - low) / width))] += 1 / (values.length * width); });
    const grid = Array.from({length: 161}, (unused, k) => low + (high - low) * k / 160);
    const curve = (mean, variance) => grid.map(x => [x, variance > 0 ? Math.exp(-(x - mean) * (x - mean) / (2 * variance)) / Math.sqrt(2 * Math.PI * variance) : null]);
    const series = [{type: 'bar', name: 'draws', barWidth: '98%', itemStyle: {color: colourOf('--faint'), opacity: 0.4}, silent: true,
      data: heights.map((height, k) => [low + (k + 0.5) * width, height])}];
    series.push({type: 'line', name: 'true', symbol: 'none', lineStyle: {color: colourOf('--ink'), width: 3.5}, itemStyle: {color: colourOf('--ink')}, data: curve(0, cloud.covariance[0][0])});
    cloud.methods.forEach(method => series.push({type: 'line', name: method.name, symbol: 'none', lineStyle: lineOf(method.name, 2),
      itemStyle: {color: look(method.name).colour}, data: curve(method.mean[0], method.covariance[0][0])}));
    draw('cloud', {series: series, legendNames: ['draws', 'true'], xAxis: axis(titled(cloud.axes[0]) + ' from the mean'), yAxis: upright('density', {min: 0}), dataZoom: ZOOM_X,
      tooltip: {trigger: 'item', formatter: hit => escapeHtml(hit.seriesName)}});
  }

  // ---- 3: track

  function truthOf(component) {
    const truth = variant().truth;
    const at = truth ? truth.components.indexOf(component) : -1;
    return at < 0 ? null : truth.values[at];
  }

  /** The range of all values; or that of the truth with some room around; or, if it stands still, that of most values. */
  function range(values, truth) {
    const sorted = values.filter(v => v !== null).sort((a, b) => a - b);
    if (!sorted.length) return [0, 1];
    const known = (truth || []).filter(v => v !== null), all = view.extent === 'all';
    const skip = all ? 0 : Math.floor(sorted.length * 0.05);
    const ends = [sorted[skip], sorted[sorted.length - 1 - skip]];
    const lowest = list => list.reduce((a, b) => Math.min(a, b), Infinity), highest = list => list.reduce((a, b) => Math.max(a, b), -Infinity);
    const moves = highest(known) > lowest(known);
    const low = all ? Math.min(ends[0], lowest(known)) : moves ? lowest(known) : ends[0];
    const high = all ? Math.max(ends[1], highest(known)) : moves ? highest(known) : ends[1];
    const room = (all ? 0.05 : 0.2) * (high - low) || 1;
    return [low - room, high + room];
  }

  /** The same number of metres to a pixel both ways. */
  function equalScales(x, y, width, height) {
    const scale = Math.max((x[1] - x[0]) / width, (y[1] - y[0]) / height);
    const around = (ends, pixels) => { const middle = (ends[0] + ends[1]) / 2; return {min: middle - scale * pixels / 2, max: middle + scale * pixels / 2}; };
    return [around(x, width), around(y, height)];
  }

  /** What is taken off a component so that its axis can be read: 0, or a round number near the truth or the last estimate. */
  function baseOf(component, drawn) {
    const truth = truthOf(component), last = drawn.length ? drawn[0].mean[component].slice(-1)[0] : 0;
    const middle = truth && truth[0] !== null ? truth[0] : last;
    return Math.abs(middle) > 1e5 ? Math.round(middle) : 0;
  }
  const named = base => base === 0 ? '' : (base < 0 ? ' + ' : ' - ') + Math.abs(base);

  function ellipsesOf(run, plane, index, base) {
    const [a, b] = plane, step = Math.max(1, Math.ceil(run.t.length / MOST_ELLIPSES)), points = [];
    for (let i = 0; i < run.t.length; i += step) {
      const around = ellipse([run.mean[a][i] - base[0], run.mean[b][i] - base[1]], run.sd[a][i] ** 2, run.covariance[index][i], run.sd[b][i] ** 2, 36);
      points.push(...around, [null, null]);
    }
    return points;
  }

  function drawTrack() {
    const plane = variant().planes ? variant().planes[view.plane] : null;
    if (!show('track', Boolean(plane) && runs().length > 0)) return;
    const [a, b] = plane, series = [], drawn = shown(), known = truthOf(a) && truthOf(b);
    const base = plane.map(component => baseOf(component, drawn));
    const less = (values, i) => values.map(value => value === null ? null : value - base[i]);
    const truth = known ? [less(truthOf(a), 0), less(truthOf(b), 1)] : [null, null];
    drawn.forEach(run => {
      series.push({type: 'line', name: run.name, symbol: 'none', lineStyle: lineOf(run.name, 1.6), itemStyle: {color: look(run.name).colour}, data: zip(less(run.mean[a], 0), less(run.mean[b], 1))});
      series.push({type: 'line', name: run.name, symbol: 'none', silent: true, connectNulls: false, lineStyle: Object.assign(lineOf(run.name, 1), {opacity: 0.65}), data: ellipsesOf(run, plane, view.plane, base)});
    });
    if (known) {
      const still = truth.every(values => values.every(value => value === values[0]));
      series.push({type: 'line', name: 'truth', symbol: still ? 'diamond' : 'none', symbolSize: 14, showSymbol: still, z: 5, connectNulls: false,
        lineStyle: {color: colourOf('--ink'), width: 2.5, type: 'dashed'}, itemStyle: {color: colourOf('--ink')}, data: still ? [[truth[0][0], truth[1][0]]] : zip(...truth)});
    }
    const box = byId('track');
    const wide = (component, i) => drawn.flatMap(run => less(run.mean[component], i).flatMap((value, k) => known ? [value] : [value - 2 * run.sd[component][k], value + 2 * run.sd[component][k]]));
    const [x, y] = equalScales(range(wide(a, 0), truth[0]), range(wide(b, 1), truth[1]), box.clientWidth - 100, box.clientHeight - 110);
    const bare = {axisLabel: {color: colourOf('--faint'), hideOverlap: true, showMinLabel: false, showMaxLabel: false, formatter: value => number(value, 9)}};
    draw('track', {series: series, legendNames: known ? ['truth'] : undefined, xAxis: axis(titled(variant().components[a]) + named(base[0]), Object.assign(x, bare)), yAxis: upright(titled(variant().components[b]) + named(base[1]), Object.assign(y, bare)), dataZoom: ZOOM_XY,
      tooltip: {trigger: 'item', formatter: hit => escapeHtml(hit.seriesName)}});
    note('track', 'Ellipses hold 95 % if the error is normal; at most ' + MOST_ELLIPSES + ' a method are drawn.', known ? '' : 'There is no truth to draw.',
      view.extent === 'all' ? '' : 'What lies far off is outside the view: see all estimates.', thinned(Math.max(...drawn.map(run => run.stride), 1), 'step'));
  }

  // ---- 4: error and standard deviation

  function drawError() {
    const component = (variant().components || [])[view.component];
    if (!show('error', Boolean(component) && runs().length > 0)) return;
    const at = variant().truth ? variant().truth.components.indexOf(view.component) : -1;
    const known = at >= 0 && hasTruth();
    byId('error-title').textContent = known ? 'Error and standard deviation' : 'Standard deviation';
    const series = [];
    shown().forEach(run => {
      const base = {type: 'line', name: run.name, symbol: 'none', itemStyle: {color: look(run.name).colour}, connectNulls: false};
      if (known) series.push(Object.assign({}, base, {lineStyle: lineOf(run.name, 1.6), data: zip(run.t, run.error[at])}));
      const band = sign => Object.assign({}, base, {silent: true, lineStyle: {color: look(run.name).colour, width: known ? 1 : 1.6, type: known ? 'dotted' : look(run.name).dash, opacity: 0.8},
        data: zip(run.t, run.sd[view.component].map(sd => sign * sd))});
      series.push(band(known ? 2 : 1));
      if (known) series.push(band(-2));
    });
    const reach = usualReach(known ? at : -1);
    const cut = view.spread === 'most' && reach.most < reach.all ? {min: known ? -reach.most : 0, max: reach.most} : {};
    draw('error', {series: series, xAxis: TIME(), yAxis: upright(titled(component, known ? 'error of ' : 'standard deviation of '), cut), dataZoom: ZOOM_XY, tooltip: {trigger: 'axis', valueFormatter: value => number(value)}});
    note('error', known ? 'Lines: estimate less truth. Dotted: plus and minus two standard deviations, which an honest filter leaves in 5 % of steps.' : 'There is no truth for this component.',
      cut.max ? 'Some lines leave the view: see all.' : '', thinned(Math.max(...shown().map(run => run.stride), 1), 'step'));
  }

  /** How far lines go: all, and three times as far as those of the middle method go for nine tenths of the time. */
  function usualReach(at) {
    const far = shown().map(run => run.sd[view.component].map((sd, i) => at < 0 ? sd : Math.max(2 * sd, Math.abs(run.error[at][i] || 0))).sort((a, b) => a - b));
    const nine = far.map(list => list[Math.floor(0.9 * (list.length - 1))]).sort((a, b) => a - b);
    const most = Number((3 * nine[Math.floor((nine.length - 1) / 2)]).toPrecision(1));
    return {most: most > 0 ? most : Infinity, all: Math.max(...far.map(list => list[list.length - 1]))};
  }

  // ---- 5: NEES and NIS

  function verdictSeries(times, values, verdicts, floor) {
    return VERDICTS.map((verdict, code) => ({
      type: 'scatter', name: verdict.name, symbol: verdict.symbol, symbolSize: 5 + (code === 1 ? 0 : 1.5), itemStyle: {color: verdict.colour},
      data: times.map((t, i) => [t, values[i] === null ? null : Math.max(values[i], floor)]).filter((p, i) => verdicts[i] === code && p[1] !== null)
    })).filter(series => series.data.length > 0);
  }

  function boundSeries(name, times, values) {
    return {type: 'line', name: name, symbol: 'none', step: 'end', silent: true, z: 1, lineStyle: {color: colourOf('--ink'), width: 1.2, type: 'dashed'}, itemStyle: {color: colourOf('--ink')}, data: zip(times, values)};
  }

  function drawSquares(id, title, times, values, verdicts, lower, upper) {
    const lowest = Math.min(...lower), floor = Math.pow(10, Math.floor(Math.log10(lowest)) - 1);
    const series = verdictSeries(times, values, verdicts, floor).concat([boundSeries('95 % bounds', times, lower), boundSeries('95 % bounds', times, upper)]);
    const highest = values.reduce((most, v) => v === null ? most : Math.max(most, v), Math.max(...upper));
    draw(id, {series: series, legendNames: [...new Set(series.map(one => one.name))], xAxis: TIME(), yAxis: upright(title, {type: 'log', min: floor, max: Math.pow(10, Math.ceil(Math.log10(highest * 1.01)))}), dataZoom: ZOOM_X,
      tooltip: {trigger: 'item', formatter: hit => escapeHtml(hit.seriesName) + '<br>' + number(hit.value[0]) + ' s: ' + number(hit.value[1])}});
    return 'Values below ' + number(floor) + ' are drawn on the lower edge.';
  }

  function drawNees() {
    const run = detail();
    if (!show('nees', Boolean(run && run.nees && run.nees.value.some(value => value !== null)))) return;
    const constant = value => run.t.map(() => value);
    const edge = drawSquares('nees', 'NEES', run.t, run.nees.value, run.nees.verdict, constant(run.nees.lower), constant(run.nees.upper));
    note('nees', run.name + ': ' + (100 * run.row.inside).toFixed(1) + ' % inside the 95 % bounds [' + number(run.nees.lower, 3) + ', ' + number(run.nees.upper, 3) + '] for '
      + run.nees.degrees + ' degrees of freedom, over all steps.', edge, thinned(run.stride, 'step'));
  }

  function drawNis() {
    const run = detail();
    if (!show('nis', Boolean(run && run.updates))) return;
    const updates = run.updates;
    const edge = drawSquares('nis', 'NIS', updates.t, updates.value, updates.verdict, updates.lower, updates.upper);
    note('nis', run.name + ': ' + number(run.row.nis) + ' per degree of freedom in the mean over accepted rows; 1 is honest. Bounds are those of each update\'s own degrees of freedom.',
      edge, thinned(updates.stride, 'update'));
  }

  // ---- 6: innovations

  function drawInnovation() {
    const run = detail();
    const group = run && run.updates ? run.updates.innovations[view.innovation] : undefined;
    if (!show('innovation', group !== undefined)) return;
    const series = verdictSeries(group.t, group.value, group.verdict, -Infinity).map(one => one.name === VERDICTS[1].name ? Object.assign(one, {name: 'used'}) : one);
    [2, -2].forEach(sign => series.push({type: 'scatter', name: '2 standard deviations', symbol: 'circle', symbolSize: 2, silent: true, z: 1, itemStyle: {color: colourOf('--ink'), opacity: 0.55},
      data: zip(group.t, group.sd.map(sd => sd === null ? null : sign * sd))}));
    const reach = reachOf(group), cut = view.spread === 'most' && reach.most < reach.all ? {min: -reach.most, max: reach.most} : {};
    draw('innovation', {series: series, legendNames: [...new Set(series.map(one => one.name))], xAxis: TIME(), yAxis: upright(titled(group), cut), dataZoom: ZOOM_XY,
      tooltip: {trigger: 'item', formatter: hit => escapeHtml(hit.seriesName) + '<br>' + number(hit.value[0]) + ' s: ' + number(hit.value[1])}});
    note('innovation', run.name + ': measurement less prediction, against the standard deviation predicted for it.', cut.max ? 'Some points leave the view: see all.' : '', thinned(group.stride, 'row'));
  }

  /** How far innovations go: all, and twice as far as nine tenths of them and of their bounds do. */
  function reachOf(group) {
    const far = group.t.map((unused, i) => Math.max(Math.abs(group.value[i] || 0), 2 * (group.sd[i] || 0))).sort((a, b) => a - b);
    const most = Number((2 * far[Math.floor(0.9 * (far.length - 1))]).toPrecision(1));
    return {most: most > 0 ? most : Infinity, all: far[far.length - 1]};
  }

  function drawWhiteness() {
    const run = detail();
    const group = run && run.updates ? run.updates.innovations[view.innovation] : undefined;
    if (!show('whiteness', group !== undefined)) return;
    byId('whiteness').hidden = group.autocorrelation.length === 0;
    if (group.autocorrelation.length === 0) {
      delete counts.whiteness;
      note('whiteness', run.name + ', ' + group.name + ': only ' + group.count + ' rows were used, too few to tell.');
      return;
    }
    const lags = group.autocorrelation.map((unused, i) => i + 1), inside = r => Math.abs(r) <= group.bound;
    const ends = [0.5, lags.length + 0.5];
    const bound = sign => boundSeries('95 % bounds', ends, [sign * group.bound, sign * group.bound]);
    const bars = (name, colour, wanted) => ({type: 'bar', name: name, stack: 'lags', barMaxWidth: 14, itemStyle: {color: colour}, data: zip(lags, group.autocorrelation.map(r => r !== null && inside(r) === wanted ? r : null))});
    draw('whiteness', {legendNames: ['inside', 'outside', '95 % bounds'], series: [bars('inside', VERDICTS[1].colour, true), bars('outside', VERDICTS[2].colour, false), bound(1), bound(-1)],
      xAxis: axis('lag (rows)', {min: ends[0], max: ends[1], scale: false, minInterval: 1, axisLabel: {color: colourOf('--faint'), formatter: v => Number.isInteger(v) ? v : ''}}), yAxis: upright('autocorrelation'), dataZoom: [],
      tooltip: {trigger: 'item', formatter: hit => 'lag ' + hit.value[0] + ': ' + number(hit.value[1], 3)}});
    const outside = group.autocorrelation.filter(r => r !== null && !inside(r)).length;
    note('whiteness', run.name + ', ' + group.name + ': ' + outside + ' of ' + lags.length + ' lags outside the bounds; about 1 in 20 is honest. Over all ' + group.count + ' rows used, none thinned.');
  }

  // ---- table

  function columns() {
    const truth = hasTruth(), heading = runs().some(run => run.row.headingRmse !== undefined);
    const all = [
      ['Method', run => run.name, run => run.name],
      truth && ['Position error, rms (m)', run => run.row.rmse],
      truth && ['largest (m)', run => run.row.max],
      heading && ['Heading error, rms (rad)', run => run.row.headingRmse],
      truth && ['NEES, mean', run => run.row.nees],
      truth && ['inside 95 %', run => run.row.inside, run => run.row.inside === undefined ? '–' : (100 * run.row.inside).toFixed(1) + ' %'],
      ['NIS per degree', run => run.row.nis],
      ['Rows gated', run => run.row.gated],
      ['skipped', run => run.row.skipped],
      ['Steps below tolerance', run => run.row.belowTolerance],
      ['Evaluations a step', run => run.row.evaluations],
      ['Jacobians a step', run => run.row.jacobians],
      ['µs a step (rough)', run => run.row.micros],
      ['Steps', run => run.row.steps]
    ];
    return all.filter(Boolean).filter(([title]) => title !== 'Steps below tolerance' || runs().some(run => run.row.belowTolerance > 0));
  }

  function sorted(wanted) {
    const list = [...runs()];
    if (!wanted) return list;
    const sign = view.descending ? -1 : 1;
    return list.sort((one, two) => {
      const a = wanted[1](one), b = wanted[1](two);
      if (a === undefined || a === null) return 1; // what is not known comes last either way
      if (b === undefined || b === null) return -1;
      return sign * (typeof a === 'string' ? a.localeCompare(b) : a - b);
    });
  }

  function headCell(title) {
    const cell = element('th', undefined, {scope: 'col'});
    const button = element('button', title, {type: 'button'});
    button.addEventListener('click', () => {
      view.descending = view.sort === title ? !view.descending : false;
      view.sort = title;
      drawTable();
      probe();
    });
    if (view.sort === title) cell.setAttribute('aria-sort', view.descending ? 'descending' : 'ascending');
    cell.append(button);
    return cell;
  }

  function bodyRow(run, all) {
    const line = element('tr');
    if (detail() === run) line.className = 'chosen';
    all.forEach(([, value, text], i) => {
      const cell = element('td', undefined);
      if (i === 0) cell.append(swatch(run.name));
      cell.append(text ? text(run) : number(value(run)));
      line.append(cell);
    });
    line.addEventListener('click', () => { view.detail = run.name; render(); });
    return line;
  }

  function drawTable() {
    const all = columns(), table = byId('table');
    const head = element('tr');
    all.forEach(([title]) => head.append(headCell(title)));
    table.tHead.replaceChildren(head);
    table.tBodies[0].replaceChildren(...sorted(all.find(([title]) => title === view.sort)).map(run => bodyRow(run, all)));
  }

  function drawRemarks() {
    const lines = [];
    if (variant().absence) lines.push(variant().absence);
    else if (!hasTruth()) lines.push('This log has no truth for this variant: there are no errors and no NEES to show.');
    runs().forEach(run => { if (run.row.belowTolerance > 0) lines.push(run.name + ': ' + run.row.belowTolerance + ' of ' + run.row.steps + ' steps below tolerance'); });
    runs().forEach(run => { if (run.status !== 'ok') lines.push(run.name + ': ' + run.status); });
    if (hasTruth()) lines.push('NEES: normalised error squared, in the mean ' + detail().row.degrees + ' if covariances are honest. Numbers here are over all steps; times are of one pass, rough, no benchmark.');
    byId('remarks').replaceChildren(...lines.map(line => element('li', line)));
  }

  // ---- controls

  function fillControls() {
    const list = runs().map(run => run.name);
    if (!list.includes(view.detail)) view.detail = list[0] || '';
    fill('detail', list, Math.max(0, list.indexOf(view.detail)));
    const boxes = list.map(name => {
      const label = element('label'), box = element('input', undefined, {type: 'checkbox'});
      box.checked = !view.hidden.has(name);
      box.addEventListener('change', () => { if (box.checked) view.hidden.delete(name); else view.hidden.add(name); render(); });
      label.append(box, swatch(name), name);
      return label;
    });
    byId('methods').replaceChildren(byId('methods').querySelector('legend'), ...boxes);
    fill('measure', ['position error', 'honesty (NEES)'], view.measure === 'rmse' ? 0 : 1);
    fill('cloud-place', variant().clouds.map(cloud => cloud.model + ', step ' + cloud.step + ': ' + cloud.which), view.place);
    const cloud = variant().clouds[view.place];
    fill('cloud-axes', cloud ? pairs(cloud.axes.length).map(([i, j]) => cloud.axes[i].name + ' and ' + cloud.axes[j].name) : [], view.axes);
    fill('plane', (variant().planes || []).map(([a, b]) => variant().components[a].name + ' and ' + variant().components[b].name), view.plane);
    fill('extent', ['around the truth, or most estimates', 'all estimates'], view.extent === 'all' ? 1 : 0);
    ['spread', 'innovation-spread'].forEach(id => fill(id, ['most', 'all'], view.spread === 'all' ? 1 : 0));
    fill('cloud-side', ['unexplained by the state, with noise', 'the output, without noise'], view.side === 'rest' ? 0 : 1);
    fill('component', (variant().components || []).map(quantity => titled(quantity)), view.component);
    const groups = detail() && detail().updates ? detail().updates.innovations : [];
    if (view.innovation >= groups.length) view.innovation = 0;
    fill('innovation-component', groups.map(group => titled(group)), view.innovation);
  }

  function choose(id, then) {
    byId(id).addEventListener('change', event => { then(Number(event.target.value)); render(); });
  }

  function wire() {
    fill('variant', data.variants.map(each => each.name + (each.label === each.name ? '' : ' (' + each.label + ')')), 0);
    choose('variant', value => Object.assign(view, {variant: value, place: 0, axes: 0, plane: 0, component: 0, innovation: 0}));
    choose('detail', value => { view.detail = runs()[value].name; });
    choose('measure', value => { view.measure = Object.keys(MEASURES)[value]; });
    choose('cloud-place', value => Object.assign(view, {place: value, axes: 0, side: variant().clouds[value].model === 'motion' ? 'output' : 'rest'}));
    choose('cloud-axes', value => { view.axes = value; });
    choose('plane', value => { view.plane = value; });
    choose('extent', value => { view.extent = ['most', 'all'][value]; });
    ['spread', 'innovation-spread'].forEach(id => choose(id, value => { view.spread = ['most', 'all'][value]; }));
    choose('cloud-side', value => { view.side = ['rest', 'output'][value]; });
    choose('component', value => { view.component = value; });
    choose('innovation-component', value => { view.innovation = value; });
    ['auto', 'light', 'dark'].forEach(theme => {
      const label = element('label'), button = element('input', undefined, {type: 'radio', name: 'theme', value: theme});
      button.checked = theme === view.theme;
      button.addEventListener('change', () => { view.theme = theme; render(); });
      label.append(button, theme === 'auto' ? 'as the system' : theme);
      byId('themes').append(label);
    });
    window.matchMedia('(prefers-color-scheme: dark)').addEventListener('change', render);
    window.addEventListener('beforeprint', () => { view.printing = true; render(); resize(); });
    window.addEventListener('afterprint', () => { view.printing = false; render(); resize(); });
    let waiting = 0;
    window.addEventListener('resize', () => { clearTimeout(waiting); waiting = setTimeout(() => { resize(); drawTrack(); }, 150); });
  }

  function resize() {
    Object.values(charts).forEach(chart => chart.resize());
  }

  function applyTheme() {
    const dark = view.theme === 'dark' || (view.theme === 'auto' && window.matchMedia('(prefers-color-scheme: dark)').matches);
    document.documentElement.dataset.theme = dark && !view.printing ? 'dark' : 'light';
  }

  function render() {
    applyTheme();
    fillControls();
    drawTable();
    drawRemarks();
    [drawTradeoff, drawCloud, drawTrack, drawError, drawNees, drawNis, drawInnovation, drawWhiteness].forEach(drawOne => drawOne());
    probe();
  }

  /** What a test reads. */
  function probe() {
    const rows = byId('table').tBodies[0].rows.length;
    byId('probe').textContent = JSON.stringify({faults: faults, series: counts, rows: rows, columns: byId('table').tHead.rows[0] ? byId('table').tHead.rows[0].cells.length : 0});
  }

  const log = data.log ? 'log ' + data.log : 'simulated';
  document.title = 'Replay: ' + data.case;
  byId('title').textContent = 'Replay: ' + data.case;
  byId('subtitle').textContent = log;
  wire();
  render();
})();
