import type { Figure } from '../../figures/figure.ts';

/**
 * A figure drawn off the screen, as one SVG element whose every text is a plain positioned run: the PDF writer misplaces
 * nested spans, so their places are read from the live drawing.
 *
 * @returns the element, still in the document so that it can be measured; the caller removes it
 */
export async function figureSvg(figure: Figure, width: number, height: number): Promise<SVGSVGElement> {
  const { svgText } = await import('../../panels/plot/plotlyBundle.ts');
  const holder = document.createElement('div');
  holder.style.cssText = 'position:absolute;left:-10000px;top:0';
  holder.setAttribute('aria-hidden', 'true');
  document.body.append(holder);
  holder.innerHTML = await svgText(figure, width, height);
  const svg = holder.querySelector('svg');
  if (svg === null) throw new Error('The chart could not be drawn');
  for (const text of svg.querySelectorAll('text')) if (text.querySelector('tspan') !== null) flatten(text);
  return svg;
}

function flatten(text: SVGTextElement): void {
  const leaves = [...text.querySelectorAll('tspan')].filter((span) => span.querySelector('tspan') === null);
  for (const leaf of leaves) {
    if ((leaf.textContent ?? '') === '') continue;
    const place = leaf.getStartPositionOfChar(0);
    const run = text.cloneNode(false) as SVGTextElement;
    run.setAttribute('x', String(place.x));
    run.setAttribute('y', String(place.y));
    run.setAttribute('text-anchor', 'start');
    run.style.textAnchor = 'start';
    run.style.fontSize = getComputedStyle(leaf).fontSize;
    run.textContent = leaf.textContent;
    text.before(run);
  }
  text.remove();
}
