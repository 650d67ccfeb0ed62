// What metro.config.js puts in place of modules that the app never calls, so that the first page is not kept waiting for them.
// The names are those that the modules which stay import while they start.
function leftOut() {
  throw new Error('This part of a library is left out of the app; see metro.config.js.');
}
// zod asks for these two for every schema that it makes, and calls what they give only when asked for JSON Schema.
export const createToJSONSchemaMethod = () => leftOut;
export const createStandardJSONSchemaMethod = () => leftOut;
export const toJSONSchema = leftOut;
export const fromJSONSchema = leftOut;
export const JSONSchemaGenerator = leftOut;
export default leftOut;
