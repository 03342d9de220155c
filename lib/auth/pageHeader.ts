/** The request header in which the proxy names the page that was asked for. */
export const PAGE_HEADER = 'x-page'
