/** Changes with every change of a formula or a rule of computation; a verdict carries it. */
export const ENGINE_VERSION = '1.0.0';
