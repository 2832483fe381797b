/**
 * Hazard, supplemental and precautionary statements in their official English wording, written down from memory of UN GHS Annex 3 and
 * CLP Annexes III and IV as before 2019 (UK spelling; US labels spell vapor), and held against the independent list in
 * fixtures/reference/ghs-statements.tsv by tests/reference/ghs.test.ts. A slash means "choose what applies"; … is filled in by the supplier.
 * Codes that OSHA and later revisions of GHS use beyond that list: H227, H229, H230–H232, H303, H305, H313, H316, H320, H333, H401, H402.
 */
export const ghsEdition = 'UN GHS / CLP wording before 2019'

const hazard = {
  H200: 'Unstable explosives.', H201: 'Explosive; mass explosion hazard.', H202: 'Explosive, severe projection hazard.',
  H203: 'Explosive; fire, blast or projection hazard.', H204: 'Fire or projection hazard.', H205: 'May mass explode in fire.',
  H220: 'Extremely flammable gas.', H221: 'Flammable gas.', H222: 'Extremely flammable aerosol.', H223: 'Flammable aerosol.',
  H224: 'Extremely flammable liquid and vapour.', H225: 'Highly flammable liquid and vapour.', H226: 'Flammable liquid and vapour.',
  H227: 'Combustible liquid.', H228: 'Flammable solid.', H229: 'Pressurised container: May burst if heated.',
  H240: 'Heating may cause an explosion.', H241: 'Heating may cause a fire or explosion.', H242: 'Heating may cause a fire.',
  H250: 'Catches fire spontaneously if exposed to air.', H251: 'Self-heating: may catch fire.', H252: 'Self-heating in large quantities; may catch fire.',
  H260: 'In contact with water releases flammable gases which may ignite spontaneously.', H261: 'In contact with water releases flammable gases.',
  H270: 'May cause or intensify fire; oxidiser.', H271: 'May cause fire or explosion; strong oxidiser.', H272: 'May intensify fire; oxidiser.',
  H280: 'Contains gas under pressure; may explode if heated.', H281: 'Contains refrigerated gas; may cause cryogenic burns or injury.',
  H290: 'May be corrosive to metals.', H300: 'Fatal if swallowed.', H301: 'Toxic if swallowed.', H302: 'Harmful if swallowed.', H303: 'May be harmful if swallowed.',
  H304: 'May be fatal if swallowed and enters airways.', H305: 'May be harmful if swallowed and enters airways.', H310: 'Fatal in contact with skin.',
  H311: 'Toxic in contact with skin.', H312: 'Harmful in contact with skin.', H313: 'May be harmful in contact with skin.',
  H314: 'Causes severe skin burns and eye damage.', H315: 'Causes skin irritation.', H316: 'Causes mild skin irritation.',
  H317: 'May cause an allergic skin reaction.', H318: 'Causes serious eye damage.', H319: 'Causes serious eye irritation.', H320: 'Causes eye irritation.',
  H330: 'Fatal if inhaled.', H331: 'Toxic if inhaled.', H332: 'Harmful if inhaled.', H333: 'May be harmful if inhaled.',
  H334: 'May cause allergy or asthma symptoms or breathing difficulties if inhaled.', H335: 'May cause respiratory irritation.',
  H336: 'May cause drowsiness or dizziness.', H340: 'May cause genetic defects.', H341: 'Suspected of causing genetic defects.', H350: 'May cause cancer.',
  H350i: 'May cause cancer by inhalation.', H351: 'Suspected of causing cancer.', H360: 'May damage fertility or the unborn child.',
  H360F: 'May damage fertility.', H360D: 'May damage the unborn child.', H360FD: 'May damage fertility. May damage the unborn child.',
  H360Fd: 'May damage fertility. Suspected of damaging the unborn child.', H360Df: 'May damage the unborn child. Suspected of damaging fertility.',
  H361: 'Suspected of damaging fertility or the unborn child.', H361f: 'Suspected of damaging fertility.', H361d: 'Suspected of damaging the unborn child.',
  H361fd: 'Suspected of damaging fertility. Suspected of damaging the unborn child.', H362: 'May cause harm to breast-fed children.',
  H370: 'Causes damage to organs.', H371: 'May cause damage to organs.', H372: 'Causes damage to organs through prolonged or repeated exposure.',
  H373: 'May cause damage to organs through prolonged or repeated exposure.', H400: 'Very toxic to aquatic life.', H401: 'Toxic to aquatic life.',
  H402: 'Harmful to aquatic life.', H410: 'Very toxic to aquatic life with long lasting effects.', H411: 'Toxic to aquatic life with long lasting effects.',
  H412: 'Harmful to aquatic life with long lasting effects.', H413: 'May cause long lasting harmful effects to aquatic life.',
} as const

const supplemental = {
  EUH001: 'Explosive when dry.', EUH006: 'Explosive with or without contact with air.', EUH014: 'Reacts violently with water.',
  EUH018: 'In use may form flammable/explosive vapour-air mixture.', EUH019: 'May form explosive peroxides.', EUH029: 'Contact with water liberates toxic gas.',
  EUH031: 'Contact with acids liberates toxic gas.', EUH032: 'Contact with acids liberates very toxic gas.', EUH044: 'Risk of explosion if heated under confinement.',
  EUH059: 'Hazardous to the ozone layer.', EUH066: 'Repeated exposure may cause skin dryness or cracking.', EUH070: 'Toxic by eye contact.',
  EUH071: 'Corrosive to the respiratory tract.', EUH201: 'Contains lead. Should not be used on surfaces liable to be chewed or sucked by children.',
  EUH201A: 'Warning! Contains lead.', EUH202: 'Cyanoacrylate. Danger. Bonds skin and eyes in seconds. Keep out of the reach of children.',
  EUH203: 'Contains chromium (VI). May produce an allergic reaction.', EUH204: 'Contains isocyanates. May produce an allergic reaction.',
  EUH205: 'Contains epoxy constituents. May produce an allergic reaction.',
  EUH206: 'Warning! Do not use together with other products. May release dangerous gases (chlorine).',
  EUH207: 'Warning! Contains cadmium. Dangerous fumes are formed during use. See information supplied by the manufacturer. Comply with the safety instructions.',
  EUH208: 'Contains … . May produce an allergic reaction.', EUH209: 'Can become highly flammable in use.', EUH209A: 'Can become flammable in use.',
  EUH210: 'Safety data sheet available on request.', EUH401: 'To avoid risks to human health and the environment, comply with the instructions for use.',
} as const

const precaution = {
  P101: 'If medical advice is needed, have product container or label at hand.', P102: 'Keep out of reach of children.', P103: 'Read label before use.',
  P201: 'Obtain special instructions before use.', P202: 'Do not handle until all safety precautions have been read and understood.',
  P210: 'Keep away from heat/sparks/open flames/hot surfaces. — No smoking.', P211: 'Do not spray on an open flame or other ignition source.',
  P220: 'Keep/Store away from clothing/…/combustible materials.', P221: 'Take any precaution to avoid mixing with combustibles …', P222: 'Do not allow contact with air.',
  P223: 'Keep away from any possible contact with water, because of violent reaction and possible flash fire.', P230: 'Keep wetted with …',
  P231: 'Handle under inert gas.', P232: 'Protect from moisture.', P233: 'Keep container tightly closed.', P234: 'Keep only in original container.', P235: 'Keep cool.',
  P240: 'Ground/bond container and receiving equipment.', P241: 'Use explosion-proof electrical/ventilating/lighting/…/equipment.', P242: 'Use only non-sparking tools.',
  P243: 'Take precautionary measures against static discharge.', P244: 'Keep reduction valves free from grease and oil.',
  P250: 'Do not subject to grinding/shock/…/friction.', P251: 'Pressurized container: Do not pierce or burn, even after use.',
  P260: 'Do not breathe dust/fume/gas/mist/vapours/spray.', P261: 'Avoid breathing dust/fume/gas/mist/vapours/spray.', P262: 'Do not get in eyes, on skin, or on clothing.',
  P263: 'Avoid contact during pregnancy/while nursing.', P264: 'Wash … thoroughly after handling.', P270: 'Do not eat, drink or smoke when using this product.',
  P271: 'Use only outdoors or in a well-ventilated area.', P272: 'Contaminated work clothing should not be allowed out of the workplace.',
  P273: 'Avoid release to the environment.', P280: 'Wear protective gloves/protective clothing/eye protection/face protection.',
  P281: 'Use personal protective equipment as required.', P282: 'Wear cold insulating gloves/face shield/eye protection.',
  P283: 'Wear fire/flame resistant/retardant clothing.', P284: 'Wear respiratory protection.', P285: 'In case of inadequate ventilation wear respiratory protection.',
  'P231+P232': 'Handle under inert gas. Protect from moisture.', 'P235+P410': 'Keep cool. Protect from sunlight.',
  P301: 'IF SWALLOWED:', P302: 'IF ON SKIN:', P303: 'IF ON SKIN (or hair):', P304: 'IF INHALED:', P305: 'IF IN EYES:', P306: 'IF ON CLOTHING:',
  P307: 'IF exposed:', P308: 'IF exposed or concerned:', P309: 'IF exposed or if you feel unwell:', P310: 'Immediately call a POISON CENTER or doctor/physician.',
  P311: 'Call a POISON CENTER or doctor/physician.', P312: 'Call a POISON CENTER or doctor/physician if you feel unwell.', P313: 'Get medical advice/attention.',
  P314: 'Get medical advice/attention if you feel unwell.', P315: 'Get immediate medical advice/attention.', P320: 'Specific treatment is urgent (see … on this label).',
  P321: 'Specific treatment (see … on this label).', P322: 'Specific measures (see … on this label).', P330: 'Rinse mouth.', P331: 'Do NOT induce vomiting.',
  P332: 'If skin irritation occurs:', P333: 'If skin irritation or rash occurs:', P334: 'Immerse in cool water/wrap in wet bandages.',
  P335: 'Brush off loose particles from skin.', P336: 'Thaw frosted parts with lukewarm water. Do not rub affected area.', P337: 'If eye irritation persists:',
  P338: 'Remove contact lenses, if present and easy to do. Continue rinsing.', P340: 'Remove victim to fresh air and keep at rest in a position comfortable for breathing.',
  P341: 'If breathing is difficult, remove victim to fresh air and keep at rest in a position comfortable for breathing.', P342: 'If experiencing respiratory symptoms:',
  P350: 'Gently wash with plenty of soap and water.', P351: 'Rinse cautiously with water for several minutes.', P352: 'Wash with plenty of soap and water.',
  P353: 'Rinse skin with water/shower.', P360: 'Rinse immediately contaminated clothing and skin with plenty of water before removing clothes.',
  P361: 'Remove/Take off immediately all contaminated clothing.', P362: 'Take off contaminated clothing and wash before reuse.', P363: 'Wash contaminated clothing before reuse.',
  P370: 'In case of fire:', P371: 'In case of major fire and large quantities:', P372: 'Explosion risk in case of fire.', P373: 'DO NOT fight fire when fire reaches explosives.',
  P374: 'Fight fire with normal precautions from a reasonable distance.', P375: 'Fight fire remotely due to the risk of explosion.', P376: 'Stop leak if safe to do so.',
  P377: 'Leaking gas fire: Do not extinguish, unless leak can be stopped safely.', P378: 'Use … for extinction.', P380: 'Evacuate area.',
  P381: 'Eliminate all ignition sources if safe to do so.', P390: 'Absorb spillage to prevent material damage.', P391: 'Collect spillage.',
  P401: 'Store …', P402: 'Store in a dry place.', P403: 'Store in a well-ventilated place.', P404: 'Store in a closed container.', P405: 'Store locked up.',
  P406: 'Store in corrosive resistant/… container with a resistant inner liner.', P407: 'Maintain air gap between stacks/pallets.', P410: 'Protect from sunlight.',
  P411: 'Store at temperatures not exceeding … °C/… °F.', P412: 'Do not expose to temperatures exceeding 50 °C/122 °F.',
  P413: 'Store bulk masses greater than … kg/… lbs at temperatures not exceeding … °C/… °F.', P420: 'Store away from other materials.', P422: 'Store contents under …',
  P501: 'Dispose of contents/container to …',
} as const

/** Whole statements that later revisions of GHS (Rev. 7 and after) added to P codes and that sheets of today print. From memory. */
const later = {
  P203: 'Obtain, read and follow all safety instructions before use.', P316: 'Get emergency medical help immediately.', P317: 'Get medical help.',
  P318: 'IF exposed or concerned, get medical advice.', P319: 'Get medical help if you feel unwell.', P364: 'And wash it before reuse.',
} as const

const statements: Record<string, string> = { ...hazard, ...supplemental, ...precaution, ...later }

/** Every single code that has a statement here. */
export const ghsCodes: readonly string[] = Object.keys(statements)

/**
 * The official statement of a code; joined codes (`P305+P351+P338`, `H302+H332`) read as their parts do, one after the other.
 * Undefined for a code that is not in the list: then the code alone is shown.
 */
export function ghsStatement(code: string): string | undefined {
  const whole = statements[code]
  if (whole) return whole
  const parts = code.split('+').map((part) => statements[part])
  return parts.every((part) => part !== undefined) ? parts.join(' ') : undefined
}

/** Pictograms of the standard by code, with what each shows and stands for. Source: UN GHS Annex 1, from memory. */
export const pictograms = {
  GHS01: { shows: 'exploding bomb', means: 'explosive' },
  GHS02: { shows: 'flame', means: 'flammable' },
  GHS03: { shows: 'flame over circle', means: 'oxidising' },
  GHS04: { shows: 'gas cylinder', means: 'gas under pressure' },
  GHS05: { shows: 'corrosion', means: 'corrosive' },
  GHS06: { shows: 'skull and crossbones', means: 'acutely toxic' },
  GHS07: { shows: 'exclamation mark', means: 'harmful, irritant or skin sensitiser' },
  GHS08: { shows: 'health hazard', means: 'serious hazard to health' },
  GHS09: { shows: 'environment', means: 'hazardous to the aquatic environment' },
} as const
export type PictogramCode = keyof typeof pictograms

/** Pictogram that a hazard statement's class calls for, before precedence. Codes without one are absent. UN GHS Annex 1, from memory. */
export const pictogramOfStatement: Record<string, PictogramCode> = Object.fromEntries(
  (
    [
      ['GHS01', 'H200 H201 H202 H203 H204 H240 H241'],
      ['GHS02', 'H220 H222 H223 H224 H225 H226 H228 H242 H250 H251 H252 H260 H261'],
      ['GHS03', 'H270 H271 H272'],
      ['GHS04', 'H280 H281'],
      ['GHS05', 'H290 H314 H318'],
      ['GHS06', 'H300 H301 H310 H311 H330 H331'],
      ['GHS07', 'H302 H312 H315 H317 H319 H332 H335 H336'],
      ['GHS08', 'H304 H334 H340 H341 H350 H350i H351 H360 H360F H360D H360FD H360Fd H360Df H361 H361f H361d H361fd H370 H371 H372 H373'],
      ['GHS09', 'H400 H410 H411'],
    ] as const
  ).flatMap(([pictogram, codes]) => codes.split(' ').map((code) => [code, pictogram])),
)
