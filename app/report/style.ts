// The report's look: light colours, one column, A4 in print.

import { ink } from './ink.ts';
import type { Markup } from './markup.ts';

/** A font file to carry in the page, as base64 of woff2. */
export interface Font {
  readonly weight: 400 | 600;
  readonly woff2Base64: string;
}

const warmSteps = [0, 1, 2, 3, 4, 5, 6, 7] as const;

export function style(fonts: readonly Font[]): Markup {
  const faces = fonts.map(
    ({ weight, woff2Base64 }) =>
      `@font-face{font-family:'IBM Plex Sans';font-weight:${weight};src:url(data:font/woff2;base64,${woff2Base64.replace(/[^A-Za-z0-9+/=]/g, '')}) format('woff2')}\n`,
  );
  return { markup: `<style>\n${faces.join('')}${rules}</style>\n` };
}

const rules = `:root{color-scheme:light}
*{box-sizing:border-box}
body{margin:0;background:${ink.sheet};color:${ink.ink};font:13px/18px 'IBM Plex Sans',system-ui,sans-serif;overflow-wrap:anywhere}
main{width:min(760px,100%);margin:0 auto;padding:28px 0 40px}
@media (max-width:800px){main{padding:20px 16px}}
h1{font-size:20px;line-height:26px;font-weight:600;margin:0 0 2px}
h2{font-size:15px;line-height:20px;font-weight:600;margin:0 0 4px}
p{margin:0 0 8px;max-width:92ch}
section{margin-top:26px}
a{color:inherit}
svg{display:block;width:100%;height:auto}
.note,header p{color:${ink['ink-2']}}
.note{font-size:11px;line-height:15px}
.answers{display:grid;grid-template-columns:repeat(3,1fr);gap:16px 24px;margin:14px 0 10px}
.answers dt{color:${ink['ink-2']}}
.answers dd{margin:0;color:${ink['ink-2']}}
.answers b{font-size:24px;line-height:28px;font-weight:600;letter-spacing:-.01em;color:${ink.ink}}
.danger,.caution b{color:${ink.warn}}
.caution{position:relative;padding-left:22px}
.caution svg{position:absolute;left:0;top:2px;width:14px;height:13px;fill:none;stroke:${ink.warn};stroke-width:1.4}
.lines{margin:0}
.lines div{display:flex;gap:12px;padding:1px 0}
.lines dt{flex:0 0 150px;color:${ink['ink-2']}}
.lines dd{margin:0;flex:1}
sup{line-height:0}
ul{margin:0 0 8px;padding-left:18px}
table{border-collapse:collapse;width:100%;margin:4px 0 6px;overflow-wrap:normal}
th,td{padding:4px 0 4px 12px;border-bottom:1px solid ${ink.line};text-align:left;vertical-align:bottom;font-weight:400}
th:first-child{padding-left:0;overflow-wrap:anywhere}
thead th{color:${ink['ink-2']};font-size:12px;line-height:15px}
thead span{display:block;color:${ink['ink-3']}}
.number{text-align:right;white-space:nowrap}
.sum th,.sum td{font-weight:600;border-bottom:0}
#balance th,#balance td{padding-left:8px;font-size:12px}
#balance th:first-child{padding-left:0}
text{font-size:12px;fill:${ink['ink-2']}}
.small{font-size:11px}
.end{text-anchor:end}
.middle{text-anchor:middle}
.strong{font-weight:600;fill:${ink.ink}}
.room-words{fill:${ink['heat-in']};font-weight:600}
.cool-words{fill:${ink['heat-out']};font-weight:600}
.air-words{fill:${ink.air}}
.band-words{fill:${ink['band-ink']}}
.grid{stroke:${ink.line};stroke-width:1;fill:none}
.edge-full{fill:${ink.ink};stroke:${ink.ink};stroke-width:1}
.edge-open{fill:${ink.sheet};stroke:${ink.ink};stroke-width:1}
.band{fill:${ink.band}}
.above{fill:${ink['amount-2']}}
.below{fill:${ink['chill-2']}}
.air-line{fill:none;stroke:${ink.air};stroke-width:1.3}
.halo{fill:none;stroke:${ink.sheet};stroke-width:5}
.room-line{fill:none;stroke:${ink['heat-in']};stroke-width:2.4;stroke-linejoin:round}
.ring{fill:${ink.sheet};stroke:${ink.ink};stroke-width:1.5}
.bar-heat{fill:${ink['heat-in']}}
.bar-cool{fill:${ink['heat-out']}}
.bar-above{fill:${ink['warm-5']}}
.bar-building{fill:${ink.ink}}
.bracket{fill:none;stroke:${ink.ink};stroke-width:1.5}
.load-heat{fill:none;stroke:${ink['heat-in']};stroke-width:2.4}
.load-cool{fill:none;stroke:${ink['heat-out']};stroke-width:2.4}
.under-heat{fill:${ink['amount-1']}}
.under-cool{fill:none}
.stream-in{fill:${ink['heat-in']}}
.stream-out{fill:${ink['heat-out']}}
.stream-sun{fill:${ink.sun};stroke:${ink['sun-ink']};stroke-width:1}
.stream-stored{fill:${ink.ghost}}
.crisp{shape-rendering:crispEdges}
${warmSteps.map((step) => `.warm-${step}{fill:${ink[`warm-${step}`]}}`).join('\n')}
.hatch-line{fill:${ink.ink}}
.print-only{display:none}
@page{size:A4;margin:15mm 14mm}
@media print{
main{width:auto;padding:0}
body{font-size:9.5pt;line-height:13pt;background:none}
.print-only{display:inline}
section{margin-top:18px}
svg,table,.answers,.caution,h2+p{break-inside:avoid}
h2,h2+p{break-after:avoid}
.keep{break-inside:avoid}
*{print-color-adjust:exact;-webkit-print-color-adjust:exact}
}
`;
