import type { OpenMember } from './identifiability.ts';

/** Changes along a direction that differ by less than this, relative, are equal. */
const equal = 0.05;

/** What a run fixes of quantities that it does not fix one by one, in words: a sentence without its stop. */
export function identifiabilityInWords(members: readonly OpenMember[]): string {
  const names = members.map(nameOf);
  if (members.length === 0) return 'The run leaves a combination of declared values open';
  if (members.length === 1) return `This run says nothing of ${/^pK/.test(names[0]) ? '' : 'the '}${names[0]}`;
  if (members.length === 2) return pairInWords(members[0], members[1]);
  const kinds = new Set(members.map(({ quantity }) => kindOf(quantity.role.kind)));
  if (kinds.has('electrode') && kinds.has('constant') && kinds.has('amount'))
    return `This run fixes ${listed(names)} only in relation to one another: with the electrode, the constants and the concentrations all free, nothing sets their scale`;
  if (kinds.has('electrode') && kinds.has('constant') && kinds.size === 2)
    return `Only the distances of ${listed(names)} from one another are fixed by this run: an error of the electrode moves all constants alike`;
  const sameRatio = members.every((member) => close(relative(member), relative(members[0])));
  if (sameRatio) return `Only the ratios of ${listed(names)} to one another are fixed by this run`;
  return `Only combinations of ${listed(names)} are fixed by this run, none of them by itself`;
}

/** The name of a quantity inside a sentence. */
export function nameOf({ quantity: { id, label } }: OpenMember): string {
  return id === 'concentration' ? 'sample concentration' : label;
}

/** "a, b and c" */
export function listed(names: readonly string[]): string {
  return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}

function pairInWords(a: OpenMember, b: OpenMember): string {
  const pair = `${nameOf(a)} and ${nameOf(b)}`;
  const ids = [a.quantity.id, b.quantity.id];
  if (ids.some((id) => id.endsWith('carbonate')) && ids.some((id) => id.endsWith('strongIon')))
    return `Only the alkalinity that ${pair} bring together is fixed by this run`;
  const linear = linearRelation(a, b);
  const proportional = proportionalRelation(a, b);
  const relation = isSameVessel(a, b) ? (linear ?? proportional) : (proportional ?? linear);
  return relation === null
    ? `Only one combination of ${pair} is fixed by this run`
    : `Only the ${relation} of ${pair} is fixed by this run`;
}

function linearRelation(a: OpenMember, b: OpenMember): string | null {
  if (a.quantity.unit !== b.quantity.unit) return null;
  if (close(a.change, -b.change)) return a.quantity.role.kind === 'acidity' ? 'mean' : 'sum';
  return close(a.change, b.change) ? 'difference' : null;
}

function proportionalRelation(a: OpenMember, b: OpenMember): string | null {
  if (!isScale(a) || !isScale(b)) return null;
  if (close(relative(a), relative(b))) return 'ratio';
  return close(relative(a), -relative(b)) ? 'product' : null;
}

/** Constants and offsets add, and so do amounts in one vessel; other quantities multiply. */
function isSameVessel({ quantity: a }: OpenMember, { quantity: b }: OpenMember): boolean {
  const vessel = ({ role }: typeof a) => ('vessel' in role ? role.vessel : null);
  return !isScaleKind(a.role.kind) || (vessel(a) !== null && vessel(a) === vessel(b));
}

function isScale({ quantity }: OpenMember): boolean {
  return isScaleKind(quantity.role.kind);
}

function isScaleKind(kind: OpenMember['quantity']['role']['kind']): boolean {
  return kind === 'buretteGain' || kindOf(kind) === 'amount';
}

function kindOf(kind: OpenMember['quantity']['role']['kind']): 'electrode' | 'constant' | 'amount' | 'burette' {
  switch (kind) {
    case 'offset':
    case 'slope':
    case 'standardPotential':
    case 'junctionHydrogen':
    case 'junctionHydroxide':
      return 'electrode';
    case 'acidity':
    case 'ionProduct':
      return 'constant';
    case 'buretteGain':
      return 'burette';
    default:
      return 'amount';
  }
}

function relative({ value, change }: OpenMember): number {
  return change / value;
}

function close(a: number, b: number): boolean {
  return Math.abs(a - b) <= equal * Math.max(Math.abs(a), Math.abs(b)) && Math.abs(a) > 0;
}
