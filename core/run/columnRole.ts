/**
 * What a column is for. 'reading' is a sensor column whose kind, pH or mV, its
 * name leaves open; 'other' is a column that takes no part.
 */
export type ColumnRole =
  | 'volume'
  | 'increment'
  | 'pH'
  | 'mV'
  | 'reading'
  | 'time'
  | 'temperature'
  | 'sample'
  | 'index'
  | 'derivative'
  | 'other';
