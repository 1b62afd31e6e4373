/** For inputs that the router fills from the address: a parameter that is not there arrives as undefined. */
export const orEmpty = (value: string | undefined): string => value ?? '';
