/** Version of the engine, kept with every stored result. It rises whenever the same input would give another figure. */
export const ENGINE_VERSION = "1.0.0";
