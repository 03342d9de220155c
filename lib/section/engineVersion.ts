/** Raised whenever a figure of any input can change. Stored with every section. */
export const ENGINE_VERSION = '1.0.0'
