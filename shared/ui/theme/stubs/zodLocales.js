// Stands in for zod's index of all languages (see metro.config.cjs).
export { default as en } from 'zod/v4/locales/en.js';
