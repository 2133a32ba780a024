/** How a least-squares fit came to its end. */
export type EndingCode =
  | 'gradient-converged'
  | 'step-converged'
  | 'cost-converged'
  | 'no-parameters'
  | 'iteration-limit'
  | 'stuck'
  | 'start-not-computable'
  | 'stopped';

/** What an ending means for the reader of a result. */
export interface Ending {
  /** Whether the parameters are a minimum of the sum of squares. */
  readonly usable: boolean;
  /** One plain sentence. */
  readonly message: string;
}

/** Every ending with its meaning. Only what is shown to be a minimum is usable. */
export const endings: Readonly<Record<EndingCode, Ending>> = {
  'gradient-converged': {
    usable: true,
    message: 'Converged: no change of the parameters lowers the sum of squares any further.',
  },
  'step-converged': {
    usable: true,
    message: 'Converged: the next step would change the parameters by a negligible amount.',
  },
  'cost-converged': {
    usable: true,
    message: 'Converged: the sum of squares has stopped falling, and no further fall is predicted.',
  },
  'no-parameters': {
    usable: true,
    message: 'Nothing was fitted: every quantity is fixed. The residuals are those of the given values.',
  },
  'iteration-limit': {
    usable: false,
    message: 'Not converged: the limit of iterations was reached while the sum of squares was still falling.',
  },
  stuck: {
    usable: false,
    message: 'Not converged: no step was found that lowers the sum of squares, yet this is not seen to be its minimum.',
  },
  'start-not-computable': {
    usable: false,
    message: 'Not started: the curve cannot be computed at the starting values.',
  },
  stopped: {
    usable: false,
    message: 'Not converged: the fit was stopped before it had come to its end.',
  },
};
