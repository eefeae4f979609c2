/** A chart as plain data for the chart library. Only what is used here is typed. */
export interface Trace {
  readonly type: 'scatter' | 'bar';
  readonly x: readonly (number | null)[] | Float64Array;
  readonly y: readonly (number | null)[] | Float64Array;
  readonly mode?: 'lines' | 'markers' | 'lines+markers';
  readonly name?: string;
  readonly xaxis?: string;
  readonly yaxis?: string;
  readonly line?: { readonly color: string; readonly width: number; readonly shape?: 'linear' | 'hvh' };
  readonly marker?: Readonly<Record<string, unknown>>;
  readonly fill?: 'tonexty' | 'tozeroy';
  readonly fillcolor?: string;
  readonly width?: number | readonly number[];
  readonly base?: number;
  readonly hoverinfo?: 'skip' | 'text';
  readonly hovertemplate?: string;
  readonly text?: readonly string[];
  readonly textposition?: 'none';
  readonly showlegend?: false;
  readonly connectgaps?: false;
  readonly customdata?: readonly number[];
}

export interface Figure {
  readonly data: readonly Trace[];
  readonly layout: Readonly<Record<string, unknown>>;
  /** What the chart shows, in a sentence, for those who do not see it. */
  readonly says: string;
}

/** Colours of a theme; the page reads them from its tokens, the dossier uses those of the light one. */
export interface Palette {
  readonly ink: string;
  readonly faint: string;
  readonly ground: string;
  readonly hairline: string;
  readonly band: string;
  readonly accent: string;
  readonly sound: string;
  readonly doubtful: string;
  readonly unsound: string;
}

export const figureFont = 'Lagwright Sans';
/** Text of charts, in pixels: the smallest size of the page. */
export const figureTextSize = 12;

/** What every chart has in common. */
export function baseLayout(palette: Palette): Record<string, unknown> {
  return {
    paper_bgcolor: 'rgba(0,0,0,0)',
    plot_bgcolor: 'rgba(0,0,0,0)',
    font: { family: `${figureFont}, sans-serif`, size: figureTextSize, color: palette.ink },
    showlegend: false,
    margin: { l: 64, r: 12, t: 8, b: 40 },
    hovermode: 'x',
    hoverlabel: { bgcolor: palette.ground, bordercolor: palette.hairline, font: { color: palette.ink } },
    dragmode: 'zoom',
    bargap: 0,
    barmode: 'overlay',
  };
}

/** An axis drawn with hairlines. */
export function baseAxis(palette: Palette, extra: Readonly<Record<string, unknown>> = {}): Record<string, unknown> {
  return {
    showgrid: false,
    zeroline: false,
    showline: true,
    linecolor: palette.hairline,
    linewidth: 1,
    ticks: 'outside',
    ticklen: 4,
    tickcolor: palette.hairline,
    tickfont: { color: palette.faint },
    ...extra,
  };
}
