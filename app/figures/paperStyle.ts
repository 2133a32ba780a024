import type { FigureStyle } from './figureStyle.ts';

/** Dark on white: figures that are saved or printed look like this whatever the screen likes. */
export const paperStyle: FigureStyle = {
  paper: '#ffffff',
  ink: '#1e2224',
  inkQuiet: '#5b6468',
  rule: '#d8d5cb',
  ruleStrong: '#8d9092',
  accent: '#17565f',
  forms: ['#6e2f0e', '#a8631a', '#3d777f', '#16395c', '#8a5a94', '#4a6b1f', '#7a1f4b', '#50565c'],
  fontFamily: 'Palatino, "Noto Serif", "Liberation Serif", Georgia, "Times New Roman", serif',
};
