import type { AnalysisReply, ReadReply } from '../../../app/worker/analysisClient.ts';
import type { Progress, Run, RunResult, SheetFile } from '../../../core/index.ts';

interface Asked {
  readonly run: Run;
  readonly sheet: SheetFile;
  readonly report: (progress: Progress) => void;
  readonly answer: (reply: AnalysisReply) => void;
  stopped: boolean;
}

/** A client without a worker: analyses are answered when the test says so, files are read as one run each. */
export class StubClient {
  readonly asked: Asked[] = [];

  analyse(run: Run, sheet: SheetFile, report: (progress: Progress) => void) {
    let answer: (reply: AnalysisReply) => void = () => {};
    const promise = new Promise<AnalysisReply>((settle) => {
      answer = settle;
    });
    const entry: Asked = { run, sheet, report, answer, stopped: false };
    this.asked.push(entry);
    return {
      answer: promise,
      stop: () => {
        entry.stopped = true;
      },
    };
  }

  async read(bytes: Uint8Array, name: string): Promise<ReadReply> {
    const text = new TextDecoder().decode(bytes);
    if (text === '')
      return {
        kind: 'read',
        job: 0,
        sha256: 'none',
        outcome: {
          ok: false,
          refusals: [{ code: 'file-empty', message: 'empty', remedy: 'choose another', place: { file: name } }],
        },
      };
    return { kind: 'read', job: 0, sha256: text, outcome: { ok: true, value: [runNamed(name)] } };
  }
}

export function runNamed(name: string): Run {
  const row = (line: number) => ({ line, volume_mL: line, reading: 3 + line, decision: { use: 'used' as const } });
  return {
    name,
    file: name,
    readingKind: 'pH',
    rows: [row(2), row(3), { ...row(4), decision: { use: 'excluded', by: 'rule', why: 'beyond range' } }],
    notAccepted: [],
    doubts: [],
  };
}

/** A reply whose result can be told by its identity; no more of it is looked at. */
export function analysed(result: RunResult): AnalysisReply {
  return { kind: 'analysed', job: 0, outcome: { ok: true, value: result } };
}

export function markedResult(message: string): RunResult {
  return { ending: { code: 'fitted', message } } as RunResult;
}
