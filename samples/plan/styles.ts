import type { Line, Style } from '../draw/style';

const lines = (width: number, inks: readonly string[], dashes: readonly string[] = ['']): readonly Line[] =>
  Array.from({ length: Math.max(inks.length, dashes.length) }, (_, at) => {
    const dash = dashes[at % dashes.length];
    return { ink: inks[at % inks.length] ?? '#000', width, ...(dash && { dash }) };
  });

/** Colour lines on white over a grey grid. */
export const colourLines: Style = {
  width: 1000,
  height: 720,
  margin: { left: 84, right: 36, top: 50, bottom: 76 },
  paper: '#ffffff',
  frame: { ink: '#303030', width: 1.2 },
  tick: { length: 6, minor: 0 },
  grid: { x: { ink: '#d0d0d0', width: 1 }, y: { ink: '#d0d0d0', width: 1 } },
  parts: 1,
  inks: [lines(2.2, ['#b3261e', '#1f5fa8', '#2b7d3a', '#b86e00', '#6a2c82', '#40464f'])],
  labels: 'beside',
  face: { weight: 0.1, stretch: 0.95, slant: 0 },
  labelFace: { weight: 0.1, stretch: 0.92, slant: 0 },
  size: { title: 13, axis: 11, tick: 10.5, label: 9 },
  ink: '#202020',
  words: {
    x: { deltaT: 'Temperature difference ΔT', I: 'Current', Tc: 'Cold side' },
    y: { Qc: 'Heat pumped', V: 'Voltage', COP: 'COP' },
  },
  turnDegrees: 0,
  finish: { file: 'png' },
};

const DASHES = ['', '9 4', '2 3.5', '12 4 2 4', '5 3', '14 3 2 3 2 3'];

/** Black ink: lines told apart by their dashes, small ticks, no grid. */
export const blackInk: Style = {
  ...colourLines,
  width: 900,
  height: 660,
  margin: { left: 80, right: 84, top: 46, bottom: 72 },
  frame: { ink: '#000000', width: 1.4 },
  tick: { length: -7, minor: -3.5 },
  grid: {},
  parts: 5,
  inks: [lines(1.8, ['#000000'], DASHES), lines(1.3, ['#000000'], ['7 4'])],
  face: { weight: 0.095, stretch: 0.9, slant: 0 },
  labelFace: { weight: 0.09, stretch: 0.9, slant: 11 },
  size: { title: 11.5, axis: 10.5, tick: 9.5, label: 8.8 },
  ink: '#000000',
  words: {
    x: { deltaT: 'ΔT', I: 'I', Tc: 'T_c' },
    y: { Qc: 'Q_c', V: 'V', COP: 'COP' },
  },
  finish: { file: 'png', grey: true },
};

/** Black ink over a light grid, for pages with two y axes. */
export const blackInkOverGrid: Style = {
  ...blackInk,
  grid: { x: { ink: '#bdbdbd', width: 0.8 }, y: { ink: '#bdbdbd', width: 0.8 } },
  tick: { length: 6, minor: 0 },
  parts: 1,
  inks: [lines(1.9, ['#000000']), lines(1.4, ['#000000'], ['8 4'])],
};

/** Print in two inks on a warm paper over fine ruling, like a catalogue. */
export const twoInks: Style = {
  ...colourLines,
  width: 1200,
  height: 860,
  margin: { left: 96, right: 40, top: 56, bottom: 88 },
  paper: '#fbf9f2',
  frame: { ink: '#22356b', width: 1.8 },
  tick: { length: 0, minor: 0 },
  grid: { fine: { ink: '#e3e6ee', width: 0.8 }, x: { ink: '#b9c2d8', width: 1.1 }, y: { ink: '#b9c2d8', width: 1.1 } },
  parts: 5,
  inks: [lines(2.6, ['#22356b']), lines(2.6, ['#c2452d'], ['13 5'])],
  face: { weight: 0.12, stretch: 0.9, slant: 0 },
  labelFace: { weight: 0.13, stretch: 0.88, slant: 0 },
  size: { title: 15, axis: 13, tick: 12, label: 10.5 },
  ink: '#22356b',
  words: {
    x: { deltaT: 'Temperature difference', I: 'Current', Tc: 'Cold face' },
    y: { Qc: 'Cooling power', V: 'Terminal voltage', COP: 'Coefficient of performance' },
  },
  finish: { file: 'png', colours: 96 },
};

/** A photocopied page on a scanner, not quite straight. */
export const scannedPage: Style = {
  ...colourLines,
  width: 940,
  height: 1330,
  margin: { left: 110, right: 70, top: 72, bottom: 96 },
  frame: { ink: '#111111', width: 1.6 },
  tick: { length: 7, minor: 3 },
  grid: { x: { ink: '#8a8a8a', width: 0.8, dash: '1.5 3' }, y: { ink: '#8a8a8a', width: 0.8, dash: '1.5 3' } },
  parts: 5,
  inks: [lines(2.1, ['#111111'])],
  face: { weight: 0.12, stretch: 0.96, slant: 0 },
  labelFace: { weight: 0.12, stretch: 0.94, slant: 0 },
  size: { title: 13, axis: 11.5, tick: 10.5, label: 9.5 },
  ink: '#111111',
  words: {
    x: { deltaT: 'Difference of temperature', I: 'Current', Tc: 'Cold side' },
    y: { Qc: 'Heat', V: 'Voltage', COP: 'COP' },
  },
  turnDegrees: 0.8,
  finish: { file: 'jpg', quality: 58, scan: { noise: 3.5, shade: 0.05, specks: 25 } },
};

/** A chart of an office program: grey ground, level lines only, markers, a legend, saved as JPEG. */
export const officeChart: Style = {
  ...colourLines,
  width: 860,
  height: 620,
  margin: { left: 82, right: 28, top: 52, bottom: 74 },
  plot: '#eef0f2',
  frame: { ink: '#5c6670', width: 1.2, open: true },
  tick: { length: 5, minor: 0 },
  grid: { y: { ink: '#ffffff', width: 1.6 } },
  inks: [lines(2.4, ['#0b5d7a', '#c25a00', '#4d7c0f', '#8a1c4a', '#52489c', '#6b5b3a'])],
  markers: true,
  labels: 'legend',
  face: { weight: 0.115, stretch: 1, slant: 0 },
  labelFace: { weight: 0.11, stretch: 0.96, slant: 0 },
  size: { title: 13, axis: 10.5, tick: 9.5, label: 9 },
  ink: '#2c333a',
  words: {
    x: { deltaT: 'Temperature difference', I: 'Supply current', Tc: 'Cold plate' },
    y: { Qc: 'Heat absorbed', V: 'Supply voltage', COP: 'COP' },
  },
  finish: { file: 'jpg', quality: 80 },
};
