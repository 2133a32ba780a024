/** How numbers are written in one file. */
export interface NumberMarks {
  readonly decimal: '.' | ',';
  /**
   * What parts groups of three digits before the decimal mark; '' for nothing.
   * ' ' stands for every kind of blank, "'" for the straight and the curly apostrophe.
   */
  readonly thousands: '' | ',' | '.' | ' ' | "'";
}
