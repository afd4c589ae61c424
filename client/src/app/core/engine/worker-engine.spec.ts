import { TestBed } from '@angular/core/testing';
import type { Circuit } from '@shared/circuit';
import type { AdviceRequest } from '@shared/diagnosis';
import type { EngineAnswer, EngineRequest } from './engine-messages';
import { WorkerEngine } from './worker-engine';

/** A worker that writes down what it is told and answers when the spec says. */
class PlayedWorker {
  static readonly all: PlayedWorker[] = [];
  readonly told: EngineRequest[] = [];
  onmessage?: (event: { data: EngineAnswer }) => void;
  onerror?: () => void;
  terminated = false;

  constructor() {
    PlayedWorker.all.push(this);
  }
  postMessage(request: EngineRequest): void {
    this.told.push(request);
  }
  terminate(): void {
    this.terminated = true;
  }
  answer(answer: EngineAnswer): void {
    this.onmessage?.({ data: answer });
  }
}

const circuit = { name: 'invented' } as unknown as Circuit;
const request = {} as AdviceRequest;
const idOf = (worker: PlayedWorker, nth: number): number => {
  const asked = worker.told.filter(({ kind }) => kind === 'advise')[nth];
  return asked?.kind === 'advise' ? asked.id : -1;
};

describe('the engine behind its port', () => {
  let engine: WorkerEngine;

  beforeEach(() => {
    PlayedWorker.all.length = 0;
    vi.stubGlobal('Worker', PlayedWorker);
    TestBed.configureTestingModule({ providers: [WorkerEngine] });
    engine = TestBed.inject(WorkerEngine);
  });
  afterEach(() => vi.unstubAllGlobals());

  it('hands a circuit over once and names it by its key afterwards', () => {
    void engine.advise(circuit, request);
    void engine.advise(circuit, request);
    void engine.advise({ ...circuit }, request);
    const kinds = PlayedWorker.all[0]!.told.map(({ kind }) => kind);
    expect(kinds).toEqual(['circuit', 'advise', 'advise', 'circuit', 'advise']);
  });

  it('gives each question its own answer, in whatever order they come', async () => {
    const first = engine.advise(circuit, request);
    const second = engine.advise(circuit, request);
    const worker = PlayedWorker.all[0]!;
    worker.answer({ id: idOf(worker, 1), ok: true, value: 'second' });
    worker.answer({ id: idOf(worker, 0), ok: true, value: 'first' });
    expect(await first).toBe('first');
    expect(await second).toBe('second');
  });

  it('passes what went wrong on', async () => {
    const asked = engine.advise(circuit, request);
    const worker = PlayedWorker.all[0]!;
    worker.answer({ id: idOf(worker, 0), ok: false, message: 'unknown tag' });
    await expect(asked).rejects.toThrow('unknown tag');
  });

  it('starts another worker after one broke, and hands the circuit over again', async () => {
    const owed = engine.advise(circuit, request);
    const failed = expect(owed).rejects.toThrow();
    PlayedWorker.all[0]!.onerror?.();
    await failed;
    expect(PlayedWorker.all[0]!.terminated).toBe(true);
    const asked = engine.advise(circuit, request);
    const worker = PlayedWorker.all[1]!;
    expect(worker.told.map(({ kind }) => kind)).toEqual(['circuit', 'advise']);
    worker.answer({ id: idOf(worker, 0), ok: true, value: 'answered' });
    expect(await asked).toBe('answered');
  });
});
