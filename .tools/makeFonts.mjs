// Cuts the one typeface of the page and the dossier to the characters they use. Run by hand when that set changes:
// node .tools/makeFonts.mjs. DejaVu Sans Condensed 2.37, see public/fonts/LICENSE.txt.
import { copyFileSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import subsetFont from 'subset-font';

const range = (from, to) => Array.from({ length: to - from + 1 }, (_, i) => String.fromCodePoint(from + i)).join('');
const text =
  range(0x20, 0x7e) +
  range(0xa0, 0x17f) + // Latin-1 and Latin Extended-A
  range(0x391, 0x3c9) + // Greek
  range(0x2070, 0x209c) + // superscripts and subscripts
  '\u2009\u2010\u2011\u2012\u2013\u2014\u2018\u2019\u201a\u201c\u201d\u201e\u2020\u2022\u2026\u2032\u2033\u20ac' +
  'ⁱᵢⱼₛₜ∂∆∇∈∏∑−∓√∞∫≈≠≡≤≥±×·÷←↑→↓↔⇒▲▼▴▾■□●○◆◇✓✗';

const source = 'node_modules/dejavu-fonts-ttf';
const target = 'public/fonts';
mkdirSync(target, { recursive: true });
for (const [file, name] of [
  ['DejaVuSansCondensed.ttf', 'lagwright-sans'],
  ['DejaVuSansCondensed-Bold.ttf', 'lagwright-sans-bold'],
]) {
  const font = readFileSync(`${source}/ttf/${file}`);
  for (const [format, ending] of [
    ['woff2', 'woff2'],
    ['truetype', 'ttf'],
  ]) {
    const cut = await subsetFont(font, text, { targetFormat: format });
    writeFileSync(`${target}/${name}.${ending}`, cut);
    console.log(`${target}/${name}.${ending} ${cut.length} bytes`);
  }
}
copyFileSync(`${source}/LICENSE`, `${target}/LICENSE.txt`);
