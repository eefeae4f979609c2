import { describe, expect, it } from 'vitest';
import type { Candidate, FitRequest } from '../../workers/contract/candidate.ts';
import type { DiagnoseRequest, Judgement } from '../../workers/contract/diagnostics.ts';
import type { Envelope } from '../../workers/contract/envelope.ts';
import type { Failure } from '../../workers/contract/failures.ts';
import type { Fit } from '../../workers/contract/fit.ts';
import type { ForensicReport, RepairedRecord } from '../../workers/contract/forensics.ts';
import type { Prediction, PredictRequest } from '../../workers/contract/prediction.ts';
import type { ReadAnswer, ReadRequest } from '../../workers/contract/reading.ts';
import type { ComparisonGroup } from '../../workers/contract/selection.ts';
import type { Shape, ShapeRequest } from '../../workers/contract/shape.ts';
import type { Series } from '../../workers/contract/series.ts';

type Leaf = string | number | boolean | null | undefined | Float64Array | Int32Array | Uint8Array;

/** `true` where T holds leaves, arrays and records alone; the offending type otherwise. */
type Plain<T> = T extends Leaf
  ? true
  : T extends (...given: never[]) => unknown
    ? { notPlain: T }
    : T extends readonly (infer Item)[]
      ? Plain<Item>
      : T extends Map<unknown, unknown> | Set<unknown> | Date | Error | Promise<unknown> | symbol | bigint
        ? { notPlain: T }
        : T extends object
          ? { [Key in keyof T]-?: Plain<T[Key]> }[keyof T]
          : { notPlain: T };

/** A constant `true` of a type that is `true` only where the compiler finds T plain: the type check is the test. */
type Proof<T> = [Plain<T>] extends [true] ? true : false;

describe('contracts', () => {
  it('hold nothing but plain data and typed arrays', () => {
    const proofs: {
      candidate: Proof<Candidate>;
      fitRequest: Proof<FitRequest>;
      fit: Proof<Fit>;
      diagnoseRequest: Proof<DiagnoseRequest>;
      judgement: Proof<Judgement>;
      predictRequest: Proof<PredictRequest>;
      prediction: Proof<Prediction>;
      comparison: Proof<readonly ComparisonGroup[]>;
      shapeRequest: Proof<ShapeRequest>;
      shape: Proof<Shape>;
      readRequest: Proof<ReadRequest>;
      readAnswer: Proof<ReadAnswer>;
      failure: Proof<Failure>;
      series: Proof<Series>;
      forensicReport: Proof<ForensicReport>;
      repairedRecord: Proof<RepairedRecord>;
      envelope: Proof<Envelope>;
    } = {
      candidate: true,
      fitRequest: true,
      fit: true,
      diagnoseRequest: true,
      judgement: true,
      predictRequest: true,
      prediction: true,
      comparison: true,
      shapeRequest: true,
      shape: true,
      readRequest: true,
      readAnswer: true,
      failure: true,
      series: true,
      forensicReport: true,
      repairedRecord: true,
      envelope: true,
    };
    expect(Object.values(proofs)).not.toContain(false);
  });

  it('and functions, collections and errors are not plain', () => {
    const proofs: {
      method: Proof<{ a: number; f: () => void }>;
      map: Proof<{ list: Map<string, number>[] }>;
      error: Proof<{ cause?: Error }>;
    } = { method: false, map: false, error: false };
    expect(Object.values(proofs)).not.toContain(true);
  });
});
