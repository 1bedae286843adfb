import { localAddress } from '@/hooks/session/useAddress';
import { placeOfPath, placesOf } from '@/hooks/session/usePlaces';
import { urlOf } from '@/hooks/api/urlOf';
import { lotEndpoints } from '@/shared/contracts/lots';

const keys = (role: Parameters<typeof placesOf>[0]) => placesOf(role).rail.map((place) => place.key);

test('every role sees the places it may use', () => {
  expect(keys('technician')).toEqual(['today', 'capture', 'lots', 'compare', 'bench']);
  expect(keys('reviewer')).toEqual(['today', 'lots', 'compare', 'bench']);
  expect(keys('manager')).toEqual(['today', 'capture', 'lots', 'compare', 'bench', 'people']);
  expect(keys('client')).toEqual(['today', 'lots']);
});

test('a phone never has more than five places at its foot', () => {
  for (const role of ['technician', 'reviewer', 'manager', 'client'] as const) {
    expect(placesOf(role).daily.length).toBeLessThanOrEqual(5);
  }
});

test.each([
  ['/', 'today'],
  ['/lots/abc', 'lots'],
  ['/captures/1/frames/2', 'capture'],
  ['/measurements/1', 'lots'],
  ['/bench/lasers/new', 'bench'],
])('%s belongs to %s', (path, place) => {
  expect(placeOfPath(path)).toBe(place);
});

test('after signing in one lands on an address of this application only', () => {
  expect(localAddress('/lots/1?aperture=2')).toBe('/lots/1?aperture=2');
  expect(localAddress('https://elsewhere.example/')).toBe('/');
  expect(localAddress('//elsewhere.example')).toBe('/');
  expect(localAddress('/\\elsewhere.example')).toBe('/');
  expect(localAddress('/sign-in?next=/sign-in')).toBe('/');
  expect(localAddress(undefined)).toBe('/');
});

test('addresses of endpoints are filled in and encoded', () => {
  expect(urlOf(lotEndpoints.lot, { params: { lotId: 'a/b' } })).toMatch(/\/api\/lots\/a%2Fb$/);
  expect(urlOf(lotEndpoints.apertures, { query: { search: '100 µm', limit: undefined } })).toMatch(
    /\/api\/apertures\?search=100\+%C2%B5m$/,
  );
  expect(() => urlOf(lotEndpoints.lot, { params: {} })).toThrow('lotId');
});
