// lines are all that is drawn with it
export { default as line } from '../../../../node_modules/d3-shape/src/line.js';
