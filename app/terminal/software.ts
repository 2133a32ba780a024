import packageDescription from '../../package.json' with { type: 'json' };

/** Name and version, as printed in documents. */
export const software = `stepwell ${packageDescription.version}`;
