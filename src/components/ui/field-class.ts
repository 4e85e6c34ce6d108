import { classes } from './classes';

/** The class of a labelled control: label above, or label and control on one line. */
export const fieldClass = (row: boolean | undefined, className?: string): string => classes('field', row && 'field-row', className);
