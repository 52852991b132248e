/** Version of the computation; it changes whenever a report could come out differently. */
export const ENGINE_VERSION = '1.1.0';
