import { checkSource } from '@/hooks/upload/checkSource';
import { guessKind } from '@/hooks/upload/guessKind';
import { MAX_FRAME_BYTES } from '@/shared/contracts/captures';
import { memorySource } from './memorySource';

const ascii = (text: string) => Array.from(text, (c) => c.charCodeAt(0));

describe('checkSource', () => {
  it.each([
    ['a.tif', [0x49, 0x49, 0x2a, 0]],
    ['a.tiff', [0x4d, 0x4d, 0, 0x2a]],
    ['a.png', [0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10]],
    ['a.jpg', [0xff, 0xd8, 0xff, 0xe0]],
    ['no-ending', [0x49, 0x49, 0x2a, 0]],
  ])('lets %s through', async (name, bytes) => {
    expect(await checkSource(memorySource(name, bytes))).toBeNull();
  });

  it.each([
    ['IMG_1.HEIC', [0, 0, 0, 24, ...ascii('ftypheic')], 'HEIC'],
    ['a.gif', ascii('GIF89a'), 'GIF'],
    ['a.bmp', ascii('BM....'), 'BMP'],
    ['a.fits', ascii('SIMPLE  ='), 'FITS'],
    ['a.dng', [0x49, 0x49, 0x2a, 0], 'camera raw'],
    ['notes.txt', ascii('hello'), 'Send TIFF, PNG or JPEG'],
    ['a.tif', ascii('hello'), 'not what the name says'],
    ['a.tif', [], 'empty'],
  ])('says of %s what to send instead', async (name, bytes, words) => {
    expect(await checkSource(memorySource(name, bytes))).toContain(words);
  });

  it('names the limit for a file that is too large, without reading it', async () => {
    const read = jest.fn();
    const source = { ...memorySource('a.tif'), sizeBytes: MAX_FRAME_BYTES + 1, read };
    expect(await checkSource(source)).toBe('The file has 201 MB. The most that is taken is 200 MB.');
    expect(read).not.toHaveBeenCalled();
  });

  it('says so when the file is gone', async () => {
    const source = { ...memorySource('a.tif'), read: () => Promise.reject(new Error('gone')) };
    expect(await checkSource(source)).toContain('Choose it again');
  });
});

describe('guessKind', () => {
  it('reads darks and flats from the name', () => {
    expect(guessKind('v01_DARK_2.tif')).toBe('dark');
    expect(guessKind('flat-3.png')).toBe('flat');
    expect(guessKind('0417-07-3.tif')).toBe('light');
  });
});
