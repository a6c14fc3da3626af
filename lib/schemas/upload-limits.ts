/** How large an upload may be. Numbers alone, so that the worker threads need not load the schemas. */

/** 40 MB: the largest file taken in. */
export const maxUploadBytes = 40 * 1024 * 1024;
/** 60 megapixels: the largest picture taken in. */
export const maxUploadPixels = 60_000_000;
