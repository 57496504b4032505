// Searching the catalogue by what a reader knows.

import { describe, expect, test } from 'vitest';
import { searchSubstances } from '../../../../server/core/substance/search.ts';

const found = (text: string) => searchSubstances(text).map(({ name, phase }) => `${name} ${phase}`);

test('an exact name or formula comes first', () => {
  expect(found('sodium')[0]).toBe('sodium cr');
  expect(found('water').slice(0, 3)).toEqual(['water l', 'water g', 'water cr']);
  expect(found('Na')[0]).toBe('sodium cr');
  expect(found('CO2')[0]).toBe('carbon_dioxide g');
  expect(found('steam')[0]).toBe('water g');
  expect(found('sodium oleate')).toEqual(['sodium_oleate cr']);
});

test('a part of a name finds all that have it, those that begin with it first', () => {
  const carbonates = found('carbonate');
  expect(carbonates).toContain('sodium_carbonate cr');
  expect(carbonates).toContain('calcium_carbonate cr');
  expect(found('ethan').slice(0, 4)).toEqual(['ethane g', 'ethane l', 'ethanol l', 'ethanol g']);
  expect(found('bicarb')).toContain('sodium_hydrogen_carbonate cr');
});

test('an element finds what holds it, and only that', () => {
  const lithium = searchSubstances('Li');
  expect(lithium.length).toBeGreaterThan(15);
  for (const substance of lithium) expect(substance.molPerKg.has('Li')).toBe(true);
});

describe('a property', () => {
  test('with a bound', () => {
    const volatile = searchSubstances('flash < 0');
    expect(volatile.map(({ name }) => name)).toContain('diethyl_ether');
    for (const { flashPointK } of volatile) expect(flashPointK?.value).toBeLessThan(273.15);
    for (const { boilingPointK } of searchSubstances('boiling>300')) {
      expect(boilingPointK?.value).toBeGreaterThan(573.15);
    }
    for (const { density } of searchSubstances('density>5000')) expect(density?.value).toBeGreaterThan(5000);
  });

  test('without one finds whatever has it', () => {
    for (const { rules } of searchSubstances('rule')) expect(rules.length).toBeGreaterThan(0);
    expect(found('rule')).toContain('gas_oil l');
  });
});

test('several words must all fit', () => {
  const ions = searchSubstances('Na liquid');
  expect(ions.length).toBeGreaterThan(3);
  for (const { phase, molPerKg } of ions) {
    expect(phase).toBe('l');
    expect(molPerKg.has('Na')).toBe(true);
  }
  expect(found('biogenic flash>100')).toContain('fame l');
  expect(found('mineral carbonate')).toContain('calcium_carbonate cr');
});

test.each(['', '   ', 'unobtainium', 'flash<', 'Na unobtainium', '<<<', '('])('nothing for %j', (text) => {
  expect(found(text)).toEqual([]);
});
