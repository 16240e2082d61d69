/** A picture of nothing: stands while it isn't known yet where a photo is, and for one that has not arrived anywhere. */
export const NOTHING_YET = 'data:image/gif;base64,R0lGODlhAQABAAAAACH5BAEKAAEALAAAAAABAAEAAAICTAEAOw==';
