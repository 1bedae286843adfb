import { decodeCounts, maskedCount, misfitOfByte, pixelIndexAt } from '@/shared/optics/framePlane';

test('counts are read as little-endian, two bytes a pixel', () => {
  const bytes = Uint8Array.of(0x34, 0x12, 0xff, 0xff).buffer;
  expect([...decodeCounts(bytes, 2, 1)]).toEqual([0x1234, 0xffff]);
  expect(() => decodeCounts(bytes, 2, 2)).toThrow(RangeError);
});

test('misfit bytes: 0 masked, 128 nothing, ten steps for one standard deviation', () => {
  expect([misfitOfByte(0), misfitOfByte(128), misfitOfByte(138), misfitOfByte(1)]).toEqual([null, 0, 1, -12.7]);
  expect(maskedCount({ widthPx: 3, heightPx: 1, bytes: Uint8Array.of(0, 128, 0) })).toBe(2);
});

test('a point belongs to the pixel whose centre is nearest', () => {
  const size = { widthPx: 10, heightPx: 5 };
  expect(pixelIndexAt(size, 3.4, 1.6)).toBe(23);
  expect(pixelIndexAt(size, -0.4, 0)).toBe(0);
  expect(pixelIndexAt(size, -0.6, 0)).toBeNull();
  expect(pixelIndexAt(size, 9.6, 0)).toBeNull();
});
