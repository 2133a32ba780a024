import { type OpenMember, openDirections, valleyOf } from '../../inference/identifiability.ts';
import { identifiabilityInWords, listed, nameOf } from '../../inference/identifiabilityInWords.ts';
import type { Doubt } from '../../notice/doubt.ts';
import type { Analysis } from '../analysis.ts';

/** Directions in which the data leave quantities open; every quantity without a value for this reason is named in one of them. */
export function unidentifiable({ fit, index, weighted, quantities }: Analysis): Doubt[] {
  const open = new Set(quantities.filter(({ whyNoU }) => whyNoU === 'undetermined').map(({ id }) => id));
  const named = new Set<string>();
  const name = (members: readonly OpenMember[]) => {
    for (const { quantity } of members) named.add(quantity.id);
  };
  const doubts: Doubt[] = [];
  for (const { members } of openDirections(fit, index)) {
    doubts.push(doubtAbout(members));
    name(members);
  }
  // What is left open by a profile that never closes, though to first order it is not; or takes a faint part above.
  weighted.run.design.quantities.forEach((quantity, q) => {
    const binding = weighted.run.bindings[q];
    if (!open.has(quantity.id) || named.has(quantity.id) || binding.kind !== 'parameter') return;
    const itself = { quantity, value: weighted.values[q], change: 1 };
    const along = valleyOf(fit, index, binding.parameter).members.filter(
      (member) => member.quantity.id !== quantity.id && open.has(member.quantity.id) && !named.has(member.quantity.id),
    );
    const self = valleyOf(fit, index, binding.parameter).members.find((member) => member.quantity.id === quantity.id);
    const members = [self ?? itself, ...along];
    doubts.push(doubtAbout(members));
    name(members);
  });
  return doubts;
}

function doubtAbout(members: readonly OpenMember[]): Doubt {
  const several = members.length > 1;
  const names = members.map(nameOf);
  return {
    code: 'unidentifiable',
    seen: `${identifiabilityInWords(members)}.`,
    means: several
      ? `${capital(listed(names))} can be changed together without changing the curve beyond its noise; no value is given for them.`
      : 'It can be changed without changing the curve beyond its noise; no value is given for it.',
    remedy: several ? 'Declare one of them.' : 'Declare it, if a result is to rest on it.',
    place: members.length === 0 ? {} : { quantity: members[0].quantity.id },
  };
}

function capital(text: string): string {
  return /^pK/.test(text) ? text : text.charAt(0).toUpperCase() + text.slice(1);
}
