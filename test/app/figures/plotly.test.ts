import { beforeEach, expect, test, vi } from 'vitest';

const library = vi.hoisted(() => ({ setPlotConfig: vi.fn(), react: vi.fn(), purge: vi.fn(), toImage: vi.fn() }));
vi.mock('plotly.js/lib/core', () => library);

const { drawFigure, pictureOfFigure } = await import('../../../app/figures/plotly.ts');
const settings = library.setPlotConfig.mock.calls;
const figure = { data: [], layout: { width: 300, height: 200 } };

beforeEach(() => {
  library.react.mockReset();
});

test('the button that sends a chart to a server is off before anything is drawn', () => {
  expect(settings).toEqual([[{ showSendToCloud: false, plotlyServerURL: '', displaylogo: false }]]);
});

test('a figure is drawn still, without buttons', async () => {
  const element = {} as HTMLElement;
  await drawFigure(element, figure);
  expect(library.react).toHaveBeenCalledWith(
    element,
    [],
    figure.layout,
    expect.objectContaining({ staticPlot: true, displayModeBar: false, showSendToCloud: false, plotlyServerURL: '' }),
  );
});

test('an SVG comes as its text, a PNG as its address, both in the size of the figure', async () => {
  library.toImage.mockResolvedValueOnce('data:image/svg+xml,%3Csvg%3E%E2%80%B2%3C%2Fsvg%3E');
  expect(await pictureOfFigure(figure, 'svg')).toBe('<svg>′</svg>');
  library.toImage.mockResolvedValueOnce('data:image/png;base64,AAAA');
  expect(await pictureOfFigure(figure, 'png', 3)).toBe('data:image/png;base64,AAAA');
  expect(library.toImage).toHaveBeenLastCalledWith(figure, { format: 'png', width: 300, height: 200, scale: 3 });
});
