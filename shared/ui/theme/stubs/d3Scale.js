// the two scales that are drawn; the whole package would bring time, colour and format with it
export { default as scaleLinear } from '../../../../node_modules/d3-scale/src/linear.js';
export { default as scaleLog } from '../../../../node_modules/d3-scale/src/log.js';
