/** Written into every result, so that a number can be traced to what computed it. */
export const ENGINE = 'ringwright 0.1.0';
