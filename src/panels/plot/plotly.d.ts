declare module 'plotly.js/lib/core' {
  import type { Figure } from '../../figures/figure.ts';

  interface HoverEvent {
    readonly points: readonly { readonly pointNumber: number; readonly x: number | string }[];
  }
  export interface PlotlyElement extends HTMLElement {
    on(event: 'plotly_hover', listener: (event: HoverEvent) => void): void;
    on(event: 'plotly_unhover', listener: () => void): void;
  }
  const Plotly: {
    register(traces: readonly unknown[]): void;
    react(element: HTMLElement, data: Figure['data'], layout: object, config: object): Promise<PlotlyElement>;
    toImage(figure: object, options: { format: 'svg'; width: number; height: number }): Promise<string>;
    purge(element: HTMLElement): void;
  };
  export default Plotly;
}
declare module 'plotly.js/lib/bar' {
  const bar: unknown;
  export default bar;
}
