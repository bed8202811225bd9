import { type Cases, page } from './make.ts';

export const STYLES: Cases = {
  'style over attribute': page(
    '<path d="M1 1h9" stroke="none" style="stroke:red"/><path d="M1 3h9" style="stroke:none"/>',
  ),
  inherit: page(
    '<g stroke="none"><path d="M1 1h9"/><path d="M1 3h9" stroke="blue"/><g stroke="red"><path d="M1 5h9" stroke="inherit"/></g></g>',
  ),
  'initial, unset and revert': page(
    '<path d="M1 1h9" style="stroke:initial"/><path d="M1 3h9" style="stroke:unset"/><path d="M1 5h9" stroke="red" style="stroke:revert"/>',
  ),
  'classes, ids, types': page(
    '<style>path{stroke:none}.a{stroke:red}#b{stroke:blue}line.a,rect{stroke:none}</style><path d="M1 1h9"/><path class="c a" d="M1 3h9"/><path id="b" d="M1 5h9"/><line class="a" x2="9" y2="9"/><rect width="5" height="5"/>',
  ),
  'later rules and more specific ones': page(
    '<style>.a{stroke:none}.b{stroke:red}path.b{stroke:none}path{stroke:red}</style><path class="a b" d="M1 1h9"/><path class="b a" d="M1 3h9"/><path class="a" d="M1 5h9"/>',
  ),
  important: page(
    '<style>.a{stroke:none!important}</style><path class="a" style="stroke:red" d="M1 1h9"/><path class="a" style="stroke:red ! important" d="M1 3h9"/>',
  ),
  'child and descendant selectors': page(
    '<style>g path{stroke:none}g&gt;path.a{stroke:red}g g path{stroke:blue}</style><path d="M1 1h9"/><g><path d="M1 3h9"/><path class="a" d="M1 5h9"/><g><path d="M1 7h9"/></g></g>',
  ),
  'sibling selectors': page(
    '<style>rect+path{stroke:none}rect~path.a{stroke:red}</style><rect width="3" height="3"/><path d="M1 3h9"/><path class="a" d="M1 5h9"/>',
  ),
  'attribute selectors': page(
    '<style>[data-x]{stroke:none}[data-y="1"]{stroke:none}</style><path data-x="" d="M1 1h9"/><path data-y="1" d="M1 3h9"/><path data-y="2" d="M1 5h9"/>',
  ),
  'pseudo-classes': page(
    '<style>path:first-child{stroke:none}path:nth-child(2){stroke:none}path:not(.a){opacity:1}</style><g><path d="M1 1h9"/><path d="M1 3h9"/><path d="M1 5h9"/></g>',
  ),
  'a rule for all': page(
    '<style>*{stroke:none}.a{stroke:red}</style><path d="M1 1h9"/><path class="a" d="M1 3h9"/>',
  ),
  'media rules': page(
    '<style>@media screen{.a{stroke:none}}@media print{.b{stroke:none}}</style><path class="a" d="M1 1h9"/><path class="b" d="M1 3h9"/>',
  ),
  'custom properties': page(
    '<style>.a{--c:none;stroke:var(--c)}.b{stroke:var(--none,red)}</style><path class="a" d="M1 1h9"/><path class="b" d="M1 3h9"/>',
  ),
  'colours of every form': page(
    [
      '#f00',
      '#f008',
      '#ff000080',
      'rgb(1,2,3)',
      'rgb(10% 20% 30% / 50%)',
      'hsl(120,50%,50%)',
      'hwb(90 10% 10%)',
      'lab(50% 40 59)',
      'color(display-p3 1 0 0)',
      'RebeccaPurple',
      'CURRENTCOLOR',
      'nonsense',
      '#ff',
      'icc-color(x)',
    ]
      .map((colour, i) => `<path d="M1 ${i}h${i + 5}" stroke="${colour}"/>`)
      .join(''),
  ),
  'strokes that are transparent': page(
    '<path d="M1 1h9" stroke="transparent"/><path d="M1 3h9" stroke="rgba(0,0,0,0)"/><path d="M1 5h9" stroke="#0000"/><path d="M1 7h9" stroke-opacity="0"/><path d="M1 9h9" stroke="rgb(0 0 0/0%)"/><path d="M1 11h9" stroke-opacity="0%"/>',
  ),
  'stroke widths': page(
    '<path d="M1 1h9" stroke-width="0"/><path d="M1 3h9" stroke-width="-1"/><path d="M1 5h9" stroke-width="1%"/><path d="M1 7h9" stroke-width="2mm"/><path d="M1 9h9" stroke-width="nonsense"/>',
  ),
  'paint servers': page(
    '<linearGradient id="g"><stop stop-color="red"/></linearGradient><path d="M1 1h9" stroke="url(#g)"/><path d="M1 3h9" stroke="url(#missing)"/><path d="M1 5h9" stroke="url(#missing) red"/><path d="M1 7h9" stroke="url(#missing) none"/>',
  ),
  'display and visibility': page(
    '<g display="none"><path d="M1 1h9" display="inline"/></g><g visibility="hidden"><path d="M1 3h9"/><path d="M1 5h9" visibility="visible"/></g><path d="M1 7h9" visibility="collapse"/><path d="M1 9h9" style="display:none"/>',
  ),
  opacity: page(
    '<g opacity="0"><path d="M1 1h9"/></g><path d="M1 3h9" opacity="0"/><path d="M1 5h9" opacity=".1"/><path d="M1 7h9" opacity="0%"/><g opacity="-1"><path d="M1 9h9"/></g>',
  ),
  currentColor: page(
    '<g color="red"><path d="M1 1h9" stroke="currentColor"/></g><g color="transparent"><path d="M1 3h9" stroke="currentColor"/></g>',
  ),
  'styles in capitals': page('<path d="M1 1h9" style="STROKE:NONE"/><path d="M1 3h9" stroke="NONE"/>'),
  'styles with errors': page(
    '<path d="M1 1h9" style="stroke:none;;x;:y;fill"/><path d="M1 3h9" style="stroke none"/><path d="M1 5h9" style="stroke:red none"/>',
  ),
  'a style sheet of another type': page(
    '<style type="text/less">path{stroke:none}</style><path d="M1 1h9"/>',
  ),
  'non-scaling strokes and paint order': page(
    '<g transform="scale(3)"><path vector-effect="non-scaling-stroke" paint-order="stroke" d="M1 1h9"/></g>',
  ),
  'words of display and visibility': page(
    '<path d="M1 5h9" display="NONE"/><path d="M1 9h9" display="block"/><path d="M1 13h9" display="junk"/><g display="contents"><path d="M1 17h9"/></g><path d="M1 21h9" display=" none "/><path d="M1 25h9" visibility="HIDDEN"/><path d="M1 29h9" visibility="junk"/><path d="M1 33h9" visibility=" collapse"/>',
  ),
  'widths and opacities of all but nothing': page(
    '<path d="M1 5h9" stroke-width="1e-3"/><path d="M1 9h9" stroke-width="calc(1px - 1px)"/><path d="M1 13h9" stroke-width="calc(1px - 5px)"/><path d="M1 17h9" opacity="0.0%"/><path d="M1 21h9" stroke-opacity="-5"/><path d="M1 25h9" opacity="junk"/><path d="M1 29h9" opacity="calc(1 - 1)"/>',
  ),
};
