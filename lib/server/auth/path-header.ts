/** Where the proxy writes the path that was asked for: a page cannot read its own address. */
export const pathHeader = 'x-hoopwright-path'
