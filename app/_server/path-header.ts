/** Set by the proxy: a server component cannot see the address that it is drawn for. */
export const PATH_HEADER = 'x-strandline-path';
