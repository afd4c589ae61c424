import { Injectable } from '@angular/core';
import type { Circuit, Fault, LiftState } from '@shared/circuit';
import type { Advice, AdviceRequest } from '@shared/diagnosis';
import type { EngineAnswer, EngineRequest } from './engine-messages';
import { EnginePort, type PracticeReading } from './engine-port';

interface Pending {
  readonly resolve: (value: never) => void;
  readonly reject: (error: Error) => void;
}

/** The engine in a Web Worker. One that breaks is replaced, and what it owed fails with a sentence. */
@Injectable()
export class WorkerEngine extends EnginePort {
  private worker?: Worker;
  private keys = new Map<Circuit, number>();
  private readonly pending = new Map<number, Pending>();
  private lastId = 0;

  override advise(circuit: Circuit, request: AdviceRequest): Promise<Advice> {
    return this.ask(circuit, (id, key) => ({ kind: 'advise', id, key, request }));
  }

  override practiceReading(
    circuit: Circuit,
    state: LiftState,
    faults: readonly Fault[],
    probes: { readonly red: string; readonly black: string; readonly ohms: number },
  ): Promise<PracticeReading> {
    return this.ask(circuit, (id, key) => ({ kind: 'practice', id, key, state, faults, probes }));
  }

  private ask<T>(
    circuit: Circuit,
    request: (id: number, key: number) => EngineRequest,
  ): Promise<T> {
    const worker = this.running();
    let key = this.keys.get(circuit);
    if (key === undefined) {
      key = ++this.lastId;
      this.keys.set(circuit, key);
      worker.postMessage({ kind: 'circuit', key, circuit } satisfies EngineRequest);
    }
    const id = ++this.lastId;
    return new Promise<T>((resolve, reject) => {
      this.pending.set(id, { resolve, reject });
      worker.postMessage(request(id, key));
    });
  }

  private running(): Worker {
    if (this.worker) return this.worker;
    const worker = new Worker(new URL('./engine.worker', import.meta.url), { type: 'module' });
    worker.onmessage = ({ data }: MessageEvent<EngineAnswer>) => this.settle(data);
    worker.onerror = () => this.replace();
    this.worker = worker;
    return worker;
  }

  private settle(answer: EngineAnswer): void {
    const pending = this.pending.get(answer.id);
    this.pending.delete(answer.id);
    if (answer.ok) pending?.resolve(answer.value as never);
    else pending?.reject(new Error(answer.message));
  }

  private replace(): void {
    this.worker?.terminate();
    this.worker = undefined;
    this.keys = new Map();
    const owed = [...this.pending.values()];
    this.pending.clear();
    for (const { reject } of owed) reject(new Error($localize`The engine stopped. Try again.`));
  }
}
