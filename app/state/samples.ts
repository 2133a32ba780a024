import citricAcid from '../../sample-data/citric-acid.csv?raw';
import citricAcidSheet from '../../sample-data/citric-acid.sheet.json?raw';
import newCompound from '../../sample-data/om-217.csv?raw';
import newCompoundSheet from '../../sample-data/om-217.sheet.json?raw';
import phthalateSheet from '../../sample-data/phthalate.sheet.json?raw';
import phthalate from '../../sample-data/phthalate.txt?raw';
import strongAcid from '../../sample-data/strong-acid-mv.csv?raw';
import strongAcidSheet from '../../sample-data/strong-acid-mv.sheet.json?raw';
import washingSoda from '../../sample-data/washing-soda.csv?raw';
import washingSodaSheet from '../../sample-data/washing-soda.sheet.json?raw';

/** An invented run that comes with the page. */
export interface Sample {
  readonly title: string;
  readonly fileName: string;
  readonly text: string;
  readonly sheet: string;
}

/** The first is shown when the page opens. */
export const samples: readonly Sample[] = [
  {
    title: 'New compound: an ampholyte weighed as its hydrochloride',
    fileName: 'om-217.csv',
    text: newCompound,
    sheet: newCompoundSheet,
  },
  { title: 'Citric acid: content of a reagent', fileName: 'citric-acid.csv', text: citricAcid, sheet: citricAcidSheet },
  {
    title: 'Hydrogen phthalate: strength of a base',
    fileName: 'phthalate.txt',
    text: phthalate,
    sheet: phthalateSheet,
  },
  {
    title: 'Washing soda: carbonate against acid',
    fileName: 'washing-soda.csv',
    text: washingSoda,
    sheet: washingSodaSheet,
  },
  {
    title: 'Hydrochloric acid against an old base, in millivolts',
    fileName: 'strong-acid-mv.csv',
    text: strongAcid,
    sheet: strongAcidSheet,
  },
];
