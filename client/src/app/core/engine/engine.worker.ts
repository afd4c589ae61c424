/// <reference lib="webworker" />
import '../shell/without-eval';
import type { Circuit } from '@shared/circuit';
import { createEngine, type Engine } from '@shared/diagnosis';
import type { EngineAnswer, EngineRequest } from './engine-messages';
import { practiceReading } from './practice-reading';

/** Engines are kept by circuit: the tables of one hunt serve all its questions. */
const circuits = new Map<number, Circuit>();
const engines = new Map<number, Engine>();

function answer(request: Exclude<EngineRequest, { kind: 'circuit' }>): unknown {
  const circuit = circuits.get(request.key);
  if (!circuit) throw new Error('unknown circuit');
  if (request.kind === 'practice') {
    return practiceReading(circuit, request.state, request.faults, request.probes);
  }
  const engine = engines.get(request.key) ?? createEngine(circuit);
  engines.set(request.key, engine);
  return engine.advise(request.request);
}

addEventListener('message', ({ data }: MessageEvent<EngineRequest>) => {
  if (data.kind === 'circuit') {
    circuits.set(data.key, data.circuit);
    return;
  }
  let result: EngineAnswer;
  try {
    result = { id: data.id, ok: true, value: answer(data) };
  } catch (error) {
    result = { id: data.id, ok: false, message: error instanceof Error ? error.message : 'failed' };
  }
  postMessage(result);
});
