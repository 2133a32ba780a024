import { type ExportUnit, readUnit } from '../units/readUnit.ts';
import type { ColumnRole } from './columnRole.ts';
import { plainWords } from './plainWords.ts';

export interface HeaderReading {
  /** Undefined where the name says nothing known. */
  readonly role?: ColumnRole;
  readonly unit?: ExportUnit;
  /** Whether a person has decided them. */
  readonly roleDecided?: boolean;
  readonly unitDecided?: boolean;
}

// Words of English, German, French, Spanish, Italian, Portuguese and Dutch headers, without accents, in lower case.
// A word that ends in * stands for every word that begins so.
const WORDS = {
  derivative: words(
    'derivative derivat* ableitung* derive* derivad* derivat* afgeleid* erc drift* slope steigung pente pendiente pendenza helling',
  ),
  increment: words(
    'increment* inkrement* schrittweite paso* dosierschritt* dose doses dosis dosi portion* incremento*',
  ),
  time: words(
    'time timestamp zeit* uhrzeit temps tiempo* tempo* tijd* hora horas heure* ora elapsed date datum fecha data duration dauer',
  ),
  temperature: words('temp temperat* temperat*'),
  volume: words(
    'v vol vol* volum* titran* titri* titul* titrat burett* buret* burett* zugabe* zugegeben* zugesetzt* verbrauch* dosier* dosed dosing ' +
      'added addition ajout* verse versee versees anadid* agregad* gasto gastad* aggiunt* adicionad* gotejad* toegevoegd* verbruik* ml naoh koh hcl',
  ),
  mV: words('mv e u emf emk eh orp redox potent* potenz* spannung* voltage* voltaj* tension* spanning* tensao'),
  reading: words(
    'reading* messwert* anzeige measured measurement mesure* signal* segnale senal lectura* lecture* lettura* leitura* medida medido misura* meetwaarde* meting wert value valeur valor valore waarde',
  ),
  sample: words(
    'sample* probe* echantillon* muestra* campione* amostra* monster* run lauf versuch* replic* wiederholung* determination* ' +
      'bestimmung* essai* ensayo* prova serie* series vial batch id group gruppe groupe titration label name',
  ),
  index: words(
    'index idx no nr num number nummer numero n i point* punkt* punto* ponto* punt step* schritt* row zeile pos position stap',
  ),
} as const;

const PH = /(?:^|[^a-z])ph(?![a-z])|^ph ?(?:wert|value|val|meas|reading|waarde)/;
const DIFFERENCE = /^(?:first |1st |2nd |second |1\. |2\. )?(?:d\d?|delta) ?\W* ?(?:ph|e|u|mv|pot\w*)(?![a-z])/;
const QUOTIENT = /\/ ?\(?(?:d|delta) ?\(?v/;
const VOLUME_STEP = /^(?:d|delta) ?\W* ?v(?:ol\w*)?(?![a-z])/;

/** What a header cell, with a units row under it where there is one, says about its column. */
export function roleFromHeader(header: string, unitsRow: string): HeaderReading {
  const name = plainWords(header);
  const { base, unit: unitInName } = splitUnit(header);
  const unit = unitOf(unitsRow) ?? unitInName;
  const role = roleOf(name, plainWords(base), unit);
  // Units of derivatives and drifts are not followed up.
  if (role === 'derivative') return { role };
  return { ...(role === undefined ? {} : { role }), ...(unit === undefined ? {} : { unit }) };
}

function roleOf(name: string, base: string, unit: ExportUnit | undefined): ColumnRole | undefined {
  if (name === '') return unit === undefined ? undefined : roleOfUnit(unit);
  const parts = base.split(/[^a-z0-9]+/).filter((part) => part !== '');
  const says = (role: keyof typeof WORDS): boolean => WORDS[role](parts);
  if (DIFFERENCE.test(name) || QUOTIENT.test(name) || says('derivative')) return 'derivative';
  if (VOLUME_STEP.test(base) || says('increment')) return 'increment';
  if (unit === 'mL/min' || unit === 'mV/min' || unit === '%') return 'other';
  if (unit === '°C' || unit === 'K') return 'temperature';
  if (unit === 's' || unit === 'min' || unit === 'h') return 'time';
  if (unit === 'mV' || (unit === 'V' && base !== '')) return 'mV';
  if (PH.test(name)) return 'pH';
  for (const role of ['temperature', 'time', 'volume', 'mV', 'reading', 'sample', 'index'] as const) {
    if (says(role)) return role;
  }
  return unit === undefined ? (name === '#' ? 'index' : undefined) : roleOfUnit(unit);
}

function roleOfUnit(unit: ExportUnit): ColumnRole | undefined {
  switch (unit) {
    case 'mL':
    case 'µL':
    case 'L':
      return 'volume';
    // A lone "V" heads volumes far more often than volts; the figures decide.
    case 'V':
      return 'volume';
    case 'mV':
      return 'mV';
    case 'pH':
      return 'pH';
    case '°C':
    case 'K':
      return 'temperature';
    case 's':
    case 'min':
    case 'h':
      return 'time';
    default:
      return 'other';
  }
}

/** "V (mL)", "V/mL", "V [mL]", "volume_ml", "Vol mL": name and unit apart. A header that is a unit has no name beside it. */
function splitUnit(header: string): { readonly base: string; readonly unit?: ExportUnit } {
  const text = header.trim();
  for (const pattern of [
    /^(.*?)\s*[([{]\s*([^()[\]{}]+?)\s*[)\]}]\s*$/,
    /^(.*?)\s*[/,:]\s*([^/]+)$/,
    /^(.*?)[\s_]+(?:in\s+)?([^\s_]+)$/,
  ]) {
    const match = pattern.exec(text);
    const unit = match === null ? undefined : unitOf(match[2]);
    if (match !== null && unit !== undefined && unit !== 'pH') return { base: match[1], unit };
  }
  const whole = readUnit(text);
  return whole === undefined || whole === 'V' || whole === 'pH' ? { base: text } : { base: '', unit: whole };
}

/** A lone K is kelvin over a column; behind a figure it could be anything. */
function unitOf(text: string): ExportUnit | undefined {
  return /^\W*K\W*$/.test(text) ? 'K' : readUnit(text);
}

function words(list: string): (parts: readonly string[]) => boolean {
  const whole = new Set<string>();
  const stems: string[] = [];
  for (const word of list.split(' ')) {
    if (word.endsWith('*')) stems.push(word.slice(0, -1));
    else whole.add(word);
  }
  // Columns side by side are numbered: "V1", "pH2".
  return (parts) =>
    parts.some(
      (part) => whole.has(part) || whole.has(part.replace(/\d+$/, '')) || stems.some((stem) => part.startsWith(stem)),
    );
}
