/** Joins class names, leaving out what is false or absent. */
export const classes = (...names: (string | false | null | undefined)[]): string => names.filter(Boolean).join(' ');
