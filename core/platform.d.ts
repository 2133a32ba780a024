/**
 * The few globals that browsers, workers and Node share and that core/ may use.
 * Everything else of the DOM is a type error here by intention.
 */
declare class TextDecoder {
  constructor(label?: string, options?: { fatal?: boolean; ignoreBOM?: boolean });
  decode(input?: Uint8Array): string;
}
