/** Version of the calculation: it changes whenever the same input can give other numbers. */
export const MODEL_VERSION = '0.1.0';
