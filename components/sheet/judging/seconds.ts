/** A time as the chart and the lists write it: two digits below ten seconds, one above. */
export const seconds = (value: number): string => value.toFixed(value < 10 ? 2 : 1);
