// Words in headings → quantities: English, German, French, Italian, Spanish, Portuguese and Dutch, in
// full and as loggers shorten them. Common usage, no source.
import type { MappedQuantity } from './mapping.ts';

export interface WordMatch {
  readonly quantity: MappedQuantity;
  /** 0 to 1: how surely the words mean it. */
  readonly weight: number;
  /** The part of the heading that matched. */
  readonly word: string;
}

const rules: readonly (readonly [MappedQuantity, number, RegExp])[] = [
  [
    'dewPointC',
    1,
    /dew ?-?point|dewpt|taupunkt|point de ros[ée]e|rugiada|roc[ií]o|orvalho|dauwpunt|\btdew\b|\btdp\b|\btd\b|\bdewp?\b/,
  ],
  [
    'wetBulbC',
    1,
    /wet ?-?bulb|feuchtkugel|bulbe humide|bulbo [uú]?h?[uú]medo|bulbo umido|\btwet\b|\btwb\b/,
  ],
  [
    'relativeHumidity',
    1,
    /rel(ative|\.)?[ _]*(hum|feu|luftf)|humidit[éàyae]|feuchte|hum[ei]d(ad|ade)|umidit|vochtigheid|\brh\b|\bhr\b|\brf\b|\bhum\b|\brhum\b|\bur\b/,
  ],
  [
    'humidityRatio',
    1,
    /humidity ratio|mixing ratio|specific hum|absolute feuchte|spezifische feuchte|\bx_?air\b/,
  ],
  [
    'vapourPressurePa',
    1,
    /vapou?r press|dampfdruck|tension de vapeur|tensione di vapore|presi[óo]n de vapor|\bvp\b/,
  ],
  [
    'seaLevelPressurePa',
    1,
    /sea ?-?level|\bmslp?\b|\bslp\b|\bqnh\b|\bqff\b|meeresh[öo]he|niveau de la mer/,
  ],
  [
    'pressurePa',
    1,
    /press(ure|ione|ion|[ãa]o)?\b|druck|presi[óo]n|luchtdruk|\bbaro|\bsp\b|\bqfe\b|\batmos\b|\bp_?air\b|\bpres\b/,
  ],
  [
    'windFromDeg',
    1,
    /wind.{0,6}(dir|richt|from|deg)|\bwdir?\b|\bwd\b|\bwd\d+m?\b|windricht|richtung|direc?ti?on|direzione|direcci[óo]n|dire[çc][ãa]o|\bdd\b/,
  ],
  [
    'windMPerS',
    1,
    /wind.{0,3}(sp|ge?sch|vel|kracht|mean|avg)|wind ?snelheid|\bwspd\b|\bws\d*m?\b|\bws\b|vent\b|viento|vento\b|\bwind\b|\bff\b|\bwindspeed\b/,
  ],
  [
    'beamHorizontalWPerM2',
    1,
    /(direct|beam|direkt|dir\.?)[ _-]*(hor|radiation on the hor)|\bbhi\b|\bdir_?h\b|\bgb\(h\)|direkte? ?(sonnen)?strahlung horizontal/,
  ],
  [
    'dniWPerM2',
    1,
    /direct[ _-]*norm|beam[ _-]*norm|direktnormal|\bdni\b|\bbni\b|\bgb\(n\)|normal direct|directe normale|direct irr|\bebn\b/,
  ],
  ['dhiWPerM2', 1, /diff(use|us|usa|uso|\b|_)|diffus|difus[ao]|\bdhi\b|\bdif\b|\bgd\(h\)|\bedh\b/],
  [
    'horizontalInfraredWPerM2',
    1,
    /infra ?-?r(ed|ot|ouge)|infraro|long ?-?wave|langwell|grandes? longueurs?|atm.{0,12}(gegen)?strahlung|gegenstrahlung|\blwd?n?\b|\blw_?in\b|\bir\(h\)|\bldown\b|\bdlr\b/,
  ],
  [
    'ghiWPerM2',
    1,
    /glob(al|ale|alstrahlung)?\b|global|\bghi\b|\bg\(h\)|\begh\b|\bgh\b|shortwave|short ?-?wave|\bsw_?(in|down)\b|\bswd\b/,
  ],
  [
    'ghiWPerM2',
    0.6,
    /solar|sonnenstrahlung|rayonnement|radia[cç]i[óoã]|radiazione|straling|irradiance|radiation|\bsun\b|pyrano|\bg\b/,
  ],
  ['opaqueSkyCover', 1, /opaque|\bopq/],
  [
    'skyCover',
    1,
    /cloud|sky ?-?cover|bew[öo]lk|bedeckung|n[ée]bulosit|nubosid|nebulosid|nuvolos|bewolking|\btotcld\b|\bn_?tot\b|\btcc\b/,
  ],
  ['ceilingM', 1, /ceil|cloud ?-?base|wolkenuntergrenze/],
  ['albedo', 1, /albedo|\balb\b|ground refl|bodenrefl/],
  [
    'dryBulbC',
    1,
    /dry ?-?bulb|air ?-?temp|temp.{0,10}(air|aria|aire|ar|ext|outdoor|out|ambient|2 ?m)|lufttemp|au(ß|ss)entemp|outdoor temp|ambient temp|\btdry\b|\btdb\b|\btair\b|\bt_?air\b|\bt2m\b|\bt_?out\b|\bt_?amb\b|\bt_?ext\b|\btamb\b|\bdb(t)?\b|luchttemp|tl\b/,
  ],
  ['dryBulbC', 0.8, /temp[eé]?r?a?t?u?r?|\btemp\b|\bluft\b|\btt\b|\bta\b|\bt\b/],
];

/** Things that a weather table may hold, but not of the air and sky outside. */
const elsewhere =
  /soil|ground temp|boden(temp|t)|\bt_?soil|room|indoor|inside|innen|raum|panel|module|batter|logger|enclosure|case|max\b|min\b|maxim|minim|std|stdev|sigma|gust|b[öo]e|rafale|raffica|r[áa]faga|quality|flag|source|uncert|qc\b|road|surface temp|water|snow|rain|precip|niederschlag|tilt|poa\b|albedo.*out|up(ward|welling)|out_?going|refl(ected|ektiert)/;

/** What a heading may mean, the surest first. */
export function matchWords(heading: string): readonly WordMatch[] {
  const text = heading
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase()
    .replace(/[_/,;:]+/g, ' ')
    .trim();
  const joined = heading.toLowerCase();
  const best = new Map<MappedQuantity, WordMatch>();
  rules.forEach(([quantity, weight, rule], k) => {
    const found = rule.exec(text) ?? rule.exec(joined);
    if (found === null || found[0] === '' || best.has(quantity)) return;
    const loss = elsewhere.test(text) && quantity !== 'albedo' ? 0.7 : 0;
    // An earlier rule is the narrower one: "dew point temperature" is no air temperature.
    const value = Math.max(0, weight - loss - (best.size > 0 ? 0.3 : 0) - k * 0.001);
    best.set(quantity, { quantity, weight: value, word: found[0] });
  });
  return [...best.values()].sort((a, b) => b.weight - a.weight);
}

/** Text in brackets or after a comma or slash at a heading's end: where units stand. */
export function unitPart(heading: string): string[] {
  const inside = [...heading.matchAll(/[[({<]([^\])}>]*)[\])}>]/g)].map((found) => found[1]);
  const behind = /[,_ ]([^\s,_[({]+)$/.exec(heading.replace(/[[({<][^\])}>]*[\])}>]/g, '').trim());
  return behind ? [...inside, behind[1]] : inside;
}

/** What a heading says of the moment of its values. */
export function standsWords(heading: string): 'mean' | 'reading' | null {
  if (/avg|average|mean|mittel|moyen|media\b|_m\b/i.test(heading)) return 'mean';
  if (/smp|sample|inst|moment|spot/i.test(heading)) return 'reading';
  return null;
}
