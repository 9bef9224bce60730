/** One locale for numbers, dates and words, so that they agree with the text around them. */
export const LOCALE = 'en-GB';
