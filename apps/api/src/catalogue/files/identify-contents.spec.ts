import { boxStl } from '../../testing/maker.js';
import { decideKind } from './decide-kind.js';
import { Glimpsing } from './glimpsing.js';
import { identifyContents, type Identity } from './identify-contents.js';

const identify = (contents: Buffer | string, chunkBytes = 1000): Identity => {
  const glimpsing = new Glimpsing();
  const bytes = Buffer.from(contents);
  for (let at = 0; at < bytes.length; at += chunkBytes) glimpsing.see(bytes.subarray(at, at + chunkBytes));
  return identifyContents(glimpsing.whole());
};
const latin = (text: string): Buffer => Buffer.from(text, 'latin1');
const solidHeader = boxStl(1, 1, 1);
solidHeader.write('solid facet normal', 0, 'latin1');

describe('the contents of a file', () => {
  it.each([
    ['stl', boxStl(1, 2, 3)],
    ['stl', solidHeader],
    ['stl', 'solid x\nfacet normal 0 0 1\nouter loop\n'],
    ['stl', '\r\nSOLID X\r\nFACET NORMAL 0 0 1\r\n'],
    ['step', 'ISO-10303-21;\nHEADER;\n'],
    ['pdf', '%PDF-1.7\n'],
    ['png', latin('\x89PNG\r\n\x1a\n....')],
    ['jpeg', latin('\xff\xd8\xff\xe0....')],
    ['webp', latin('RIFF....WEBPVP8 ')],
    ['wav', latin('RIFF....WAVEfmt ')],
    ['mp3', latin('ID3\x04....')],
    ['mp3', latin('\xff\xfb\x90\x64....')],
    ['ogg', latin('OggS....')],
    ['flac', latin('fLaC....')],
    ['text', '# Übungen\n\nTune **C5** first. ♯\n'],
    ['text', '\ufeffplain, with <b>a tag</b> in it'],
  ])('are recognised as %s', (kind, contents) => {
    expect(identify(contents)).toEqual({ kind });
  });

  it.each([
    ['', /empty/],
    ['<!doctype html><p>', /web page/],
    ['<!-- x --><script>alert(1)</script>', /web page/],
    ['<svg onload="x">', /SVG/],
    ['<?xml version="1.0"?><!DOCTYPE svg PUBLIC "x"><svg>', /SVG|web page/],
    ['<?xml version="1.0"?><a/>', /XML/],
    ['#!/usr/bin/env node', /program/],
    [latin('MZ\x90\x00'), /program/],
    [latin('\x7fELF\x02'), /program/],
    [latin('PK\x05\x06').toString('latin1') + '\0'.repeat(18), /zip archive, not a 3MF.*one by one/],
    [latin('PK\x03\x04 cut off'), /breaks off/],
    [latin('Rar!\x1a\x07'), /RAR/],
    [latin('\x00\x01\x02\xff'), /none of the kinds/],
    [latin('caf\xe9'), /none of the kinds/],
  ])('are refused with a reason: %j', (contents, reason) => {
    const identity = identify(contents);
    expect(identity.kind).toBeNull();
    expect((identity as { fault: string }).fault).toMatch(reason);
  });

  it('are text also where a letter lies across two chunks, and not where one is broken at the end', () => {
    expect(identify('aäöü♯'.repeat(50), 7)).toEqual({ kind: 'text' });
    expect(identify(Buffer.from('ä♯').subarray(0, 4), 3).kind).toBeNull();
  });

  it('decide the kind and the ending of the name', () => {
    expect(decideKind('x.mp3', { kind: 'wav' })).toEqual({ kind: 'wav', fileName: 'x.wav' });
    expect(decideKind('x.stl', { kind: '3mf' })).toEqual({ kind: '3mf', fileName: 'x.3mf' });
    expect(decideKind('x.JPEG', { kind: 'jpeg' })).toEqual({ kind: 'jpeg', fileName: 'x.JPEG' });
    expect(decideKind('part', { kind: 'stl' })).toEqual({ kind: 'stl', fileName: 'part.stl' });
    expect(decideKind('LICENCE', { kind: 'text' })).toEqual({ kind: 'text', fileName: 'LICENCE' });
  });

  it('that cannot be told go to the measuring room only under the name of a mesh', () => {
    const unknown: Identity = { kind: null, isNothingKnown: true, fault: 'is none of the kinds.' };
    expect(decideKind('x.stl', unknown)).toEqual({ kind: 'stl', fileName: 'x.stl' });
    expect(() => decideKind('x.bin', unknown)).toThrow('“x.bin” is none of the kinds.');
    expect(() => decideKind('x.stl', { kind: null, fault: 'is a program.' })).toThrow('is a program');
    expect(() => decideKind('x.3mf', { kind: 'pdf' })).toThrow('named as a mesh, but its content is a PDF');
  });
});
