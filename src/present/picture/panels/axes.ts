/** An axis label in a notation of the grammar; zero has no sign and no unit. */
export const signed = (format: string): string =>
  `datum.value === 0 ? '0' : format(datum.value, '${format}')`;
