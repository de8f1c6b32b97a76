/** Of every person in the tests. */
export const testPassword = 'three lapped rings'
