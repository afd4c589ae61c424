import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { faultModes } from '../../circuit';
import { cautionCodes, dangerSchema } from '../../diagnosis';
import { hasSentence, sentenceOf, sentences, useSentences } from './sentenceOf';

const sources = (folder: string): string =>
  readdirSync(folder)
    .filter((name) => name.endsWith('.ts') && !name.endsWith('.spec.ts'))
    .map((name) => readFileSync(`${folder}/${name}`, 'utf8'))
    .join('\n');

const codesIn = (text: string, pattern: RegExp): string[] =>
  [...new Set([...text.matchAll(pattern)].map((match) => match[1]!))].sort();

describe('the table of sentences', () => {
  it('has one for every finding on a circuit', () => {
    const codes = codesIn(sources('shared/circuit'), /'(circuit\.[a-z-]+)'/g);
    expect(codes.length).toBeGreaterThan(15);
    expect(codes.filter((code) => !hasSentence(code))).toEqual([]);
  });

  it('has one for every reason that the engine gives', () => {
    const codes = codesIn(sources('shared/diagnosis'), /reason\(\s*'([a-z A-Z]+)'/g);
    expect(codes.length).toBeGreaterThan(2);
    expect(codes.filter((code) => !hasSentence(`reason.${code}`))).toEqual([]);
  });

  it('has one for every refusal and need of a case', () => {
    const text = sources('shared/cases');
    const refusals = codesIn(text, /refusal\('([a-z-]+)'/g);
    const needs = codesIn(text, /(?:need|missing)\(\s*'([a-z ]+)'/g);
    const weaknesses = codesIn(text, /say\(\s*'(?:grave|note)',\s*'([a-z-]+)'/g);
    expect(refusals.length).toBeGreaterThan(8);
    expect(needs.length).toBeGreaterThan(8);
    expect(weaknesses.length).toBeGreaterThan(12);
    expect(refusals.filter((code) => !hasSentence(`case.${code}`))).toEqual([]);
    expect(needs.filter((code) => !hasSentence(`need.${code}`))).toEqual([]);
    expect(weaknesses.filter((code) => !hasSentence(`weakness.${code}`))).toEqual([]);
  });

  it('has words for every mode, caution and danger', () => {
    expect(faultModes.filter((mode) => !hasSentence(`mode.${mode}`))).toEqual([]);
    expect(cautionCodes.filter((code) => !hasSentence(`caution.${code}.can`))).toEqual([]);
    expect(cautionCodes.filter((code) => !hasSentence(`caution.${code}.do`))).toEqual([]);
    const dangers = dangerSchema.shape.code.options;
    expect(dangers.filter((code) => !hasSentence(`danger.${code}`))).toEqual([]);
  });

  it('fills in details, and shows a code that it does not know', () => {
    expect(sentenceOf('case.probes-on-one-tag', { tag: 'T4' })).toContain('T4');
    expect(sentenceOf('no.such.code', { a: 1 })).toBe('no.such.code');
    expect(sentenceOf('constructor')).toBe('constructor');
  });

  it('takes another language, and keeps English where that has nothing', () => {
    useSentences({ 'mode.open': 'offen' });
    expect(sentenceOf('mode.open')).toBe('offen');
    expect(sentenceOf('mode.blown')).toBe('blown');
    useSentences(sentences);
    expect(sentenceOf('mode.open')).toBe('open');
  });
});
