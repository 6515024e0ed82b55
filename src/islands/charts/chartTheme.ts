/** Colours and type of a chart, resolved to what the renderer can paint (hex). */
export interface ChartTheme {
  sheet: string;
  ink: string;
  quiet: string;
  rule: string;
  accent: string;
  warning: string;
  refusal: string;
  fontFamily: string;
}

export const chartFont = 'Manrope, ui-sans-serif, system-ui, sans-serif';

/** Black on white, whatever the screen showed. */
export const printTheme: ChartTheme = {
  sheet: '#ffffff',
  ink: '#000000',
  quiet: '#444444',
  rule: '#bbbbbb',
  accent: '#000000',
  warning: '#000000',
  refusal: '#000000',
  fontFamily: chartFont,
};

/** The drawing area that a builder lays out for, in CSS pixels. */
export interface ChartFrame {
  width: number;
  height: number;
}
