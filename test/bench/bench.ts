import { curveBench } from './curveBench.ts';
import { engineBench } from './engineBench.ts';
import { fitBench } from './fitBench.ts';
import { inferenceBench } from './inferenceBench.ts';
import { peerBench } from './peerBench.ts';
import { readBench } from './readBench.ts';

// Counts are the same on every machine; times are medians with their range over rounds, and only their ratios compare.
for (const bench of [curveBench, fitBench, inferenceBench, engineBench, readBench, peerBench])
  console.log(`${bench().join('\n')}\n`);
