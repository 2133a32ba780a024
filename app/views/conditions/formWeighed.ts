/** The form in which a substance was weighed, of `groups` ionisable groups. */
export interface WeighedForm {
  readonly chargeFullyProtonated: number;
  readonly protonsLost: number;
}

const counts = ['', 'mono', 'di', 'tri', 'tetra', 'penta', 'hexa'];
const numbers = ['no', 'one', 'two', 'three', 'four', 'five', 'six'];

/** A weighed form in a chemist's words: free acid, dihydrochloride, monosodium salt, zwitterion. */
export function formWeighed(groups: number, { chargeFullyProtonated, protonsLost }: WeighedForm): string {
  const charge = chargeFullyProtonated - protonsLost;
  const isUsual = chargeFullyProtonated >= 0 && chargeFullyProtonated <= groups;
  if (!isUsual) return `the form of charge ${signed(charge)}`;
  if (charge > 0) return charge === 1 ? 'the hydrochloride' : `the ${counts[charge]}hydrochloride`;
  if (charge < 0) return groups === 1 ? 'the sodium salt' : `the ${counts[-charge]}sodium salt`;
  if (chargeFullyProtonated === 0) return 'the free acid';
  return chargeFullyProtonated === groups ? 'the free base' : 'the zwitterion or neutral form';
}

/** What the charge of the fully protonated form says about the groups. */
export function kindsOfGroup(groups: number, chargeFullyProtonated: number): string {
  if (chargeFullyProtonated < 0 || chargeFullyProtonated > groups)
    return `fully protonated form of charge ${signed(chargeFullyProtonated)}`;
  const acids = groups - chargeFullyProtonated;
  if (chargeFullyProtonated === 0) return `${numbers[groups]} acid group${plural(groups)}`;
  if (acids === 0) return `${numbers[groups]} basic group${plural(groups)}`;
  return `${numbers[acids]} acid and ${numbers[chargeFullyProtonated]} basic group${plural(chargeFullyProtonated)}`;
}

function signed(charge: number): string {
  return charge > 0 ? `+${charge}` : charge < 0 ? `−${-charge}` : '0';
}

function plural(count: number): string {
  return count === 1 ? '' : 's';
}
