// What metro.config.js gives zod in place of all its languages.
export { default as en } from 'zod/v4/locales/en.js';
