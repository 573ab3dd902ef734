import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';
import { BOUNDARY, bytesOf, fieldPart, filePartOf, formOf, type Part, requestOf, statusOf } from '../support/multipart';
import * as b from '../support/pictureBytes';
import { eventually, MAX_BYTES, type PictureServer, pictureId, pictureServer } from '../support/pictureServer';

let server: PictureServer;
let photo: Buffer;
beforeAll(async () => {
  server = await pictureServer();
  photo = await b.fourFields().jpeg().toBuffer();
});
afterEach(async () => {
  await eventually(() => server.incoming().length === 0, 'nothing is left of the upload');
  await server.empty();
  expect(server.faults.splice(0)).toEqual([]);
});
afterAll(() => server.close());

const filePart = (name = 'fish.jpg', field = 'picture', body: Buffer | string = photo) => filePartOf(body, name, field);

/** Any name may come with a picture; none is used, and the picture is stored. */
describe('the name of a file', () => {
  test.each([
    ['climbs folders', '../../../../etc/cron.d/x'],
    ['is a path of another system', 'C:\\Windows\\system32\\x.dll'],
    ['is a reserved word there', 'CON'],
    ['is hidden', '.htaccess'],
    ['is nothing but dots', '..'],
    ['holds an encoded zero', 'fish%00.php.jpg'],
    ['reads from right to left', 'fish\u202Egpj.exe'],
    ['is Arabic', 'سمكة.jpg'],
    ['is an emoji', '🐟🐠.jpg'],
    ['has accents in two forms', 'Ma\u0308nnchen é.jpg'],
    ['has 10,000 letters', `${'f'.repeat(10_000)}.jpg`],
    ['ends as a script', 'fish.php'],
    ['ends as a page', 'fish.html'],
    ['ends as an SVG', 'fish.svg'],
    ['has no ending', 'fish'],
    ['is a page', '<img src=x onerror=alert(1)>.jpg'],
    ['is a command', '$(reboot);`reboot`|reboot.jpg'],
    ['is an option', '--help'],
    ['is a query', "fish'; drop table photo; --.jpg"],
    ['is a template', '{{7*7}}<%= 7*7 %>.jpg'],
    ['is blank', '   '],
    ['holds line breaks', 'fish%0D%0ASet-Cookie: a=b.jpg'],
    ['holds half a letter', 'fish\ud83d.jpg'],
  ])('that %s does no harm', async (_what, name) => {
    const id = pictureId();
    const answer = await server.raw(requestOf(formOf(filePart(name)), { id }));
    expect(statusOf(answer), answer.slice(0, 300)).toBe(200);
    expect(server.stored()).toEqual([id]);
    expect(answer).not.toContain('Set-Cookie');
  });

  test('that holds a zero is refused with its form', async () => {
    expect(statusOf(await server.raw(requestOf(formOf(filePart('fish\u0000.jpg')))))).toBe(400);
  });

  test('in the old Latin letters does no harm', async () => {
    const part = filePart('F\u00eche.jpg');
    const form = Buffer.from(formOf({ ...part, body: 'HERE' }).toString('utf8'), 'latin1');
    const at = form.indexOf('HERE');
    const whole = bytesOf(form.subarray(0, at), photo, form.subarray(at + 4));
    expect(statusOf(await server.raw(requestOf(whole)))).toBe(200);
  });
});

describe('a form', () => {
  const form = () => formOf(filePart());
  const many = (count: number, make: (i: number) => Part) => Array.from({ length: count }, (_, i) => make(i));
  const half = () => form().subarray(0, Math.floor(form().length / 2));

  test.each<[string, () => Buffer, number[]]>([
    ['without a boundary', () => requestOf(form(), { type: 'multipart/form-data' }), [400]],
    ['with an empty boundary', () => requestOf(form(), { type: 'multipart/form-data; boundary=' }), [400, 422]],
    ['with another boundary', () => requestOf(form(), { type: 'multipart/form-data; boundary=other' }), [400]],
    [
      'with a boundary of 9,000 letters',
      () => requestOf(form(), { type: `multipart/form-data; boundary=${'x'.repeat(9000)}` }),
      [400],
    ],
    ['of another multipart kind', () => requestOf(form(), { type: `multipart/mixed; boundary=${BOUNDARY}` }), [415]],
    ['sent as text', () => requestOf(photo, { type: 'text/plain' }), [415]],
    ['sent as JSON', () => requestOf(bytesOf('{"picture":"x"}'), { type: 'application/json' }), [415]],
    ['sent as a picture without a form', () => requestOf(photo, { type: 'image/jpeg' }), [415]],
    [
      'of another encoding',
      () => requestOf(bytesOf('picture=x'), { type: 'application/x-www-form-urlencoded' }),
      [415],
    ],
    ['with a type that is garbage', () => requestOf(form(), { type: ';;;=,' }), [415]],
    ['that is empty', () => requestOf(Buffer.alloc(0)), [400, 415]],
    ['that is nothing but its end', () => requestOf(bytesOf(`--${BOUNDARY}--\r\n`)), [400, 422]],
    ['that ends in the middle', () => requestOf(half()), [400]],
    ['without its last line', () => requestOf(form().subarray(0, form().length - BOUNDARY.length - 6)), [400]],
    ['of garbage', () => requestOf(Buffer.alloc(5000, 0x41)), [400, 422]],
    ['without a picture', () => requestOf(formOf(fieldPart('note', 'x'))), [422]],
    ['with a picture of no bytes', () => requestOf(formOf(filePart('fish.jpg', 'picture', ''))), [422]],
    ['with a text where the picture should be', () => requestOf(formOf(fieldPart('picture', 'x'))), [422]],
    ['with a file of no name', () => requestOf(formOf(filePart(''))), [422]],
    ['with the picture under another name', () => requestOf(formOf(filePart('a.jpg', 'avatar'))), [400]],
    ['with a picture for a name that inherits', () => requestOf(formOf(filePart('a.jpg', '__proto__'))), [400]],
    ['with two pictures', () => requestOf(formOf(filePart(), filePart())), [400]],
    ['with a hundred pictures', () => requestOf(formOf(...many(100, () => filePart('a.jpg', 'picture', 'x')))), [400]],
    ['with a second picture under another name', () => requestOf(formOf(filePart(), filePart('b.jpg', 'b'))), [400]],
    ['with 21 fields', () => requestOf(formOf(...many(21, (i) => fieldPart(`f${i}`, 'x')), filePart())), [400]],
    [
      'with 5,000 fields',
      () => requestOf(formOf(...many(5000, (i) => fieldPart(`f${i}`, 'x')), filePart())),
      [400, 413],
    ],
    [
      'with 100,000 empty parts',
      () => requestOf(bytesOf(`--${BOUNDARY}\r\n\r\n\r\n`.repeat(50_000), `--${BOUNDARY}--`)),
      [400, 422],
    ],
    [
      'with a field name of 5,000 letters',
      () => requestOf(formOf(fieldPart('n'.repeat(5000), 'x'), filePart())),
      [400],
    ],
    ['with a file field name of 5,000 letters', () => requestOf(formOf(filePart('a.jpg', 'n'.repeat(5000)))), [400]],
    ['with a field of 100 kB', () => requestOf(formOf(fieldPart('note', 'x'.repeat(100_000)), filePart())), [400]],
    ['with the same field twice', () => requestOf(formOf(fieldPart('a', '1'), fieldPart('a', '2'), filePart())), [400]],
    ['with a list', () => requestOf(formOf(fieldPart('a[]', '1'), filePart())), [400]],
    ['with a nested field', () => requestOf(formOf(fieldPart('a[b][c]', '1'), filePart())), [400]],
    ['with a list of a billion', () => requestOf(formOf(fieldPart('a[999999999]', '1'), filePart())), [400]],
    [
      'with a field without a name',
      () => requestOf(formOf({ head: 'Content-Disposition: form-data', body: 'x' }, filePart())),
      [400, 200],
    ],
    ['with a part without any head', () => requestOf(formOf({ head: 'X: y', body: 'x' }, filePart())), [200, 400]],
    ['with a part whose head has no colon', () => requestOf(formOf({ head: 'garbage', body: 'x' }, filePart())), [400]],
    [
      'with a part head of 100 kB',
      () => requestOf(formOf({ head: `X: ${'y'.repeat(100_000)}`, body: 'x' }, filePart())),
      [400],
    ],
    [
      'with a part of 3,000 head lines',
      () => requestOf(formOf({ head: 'X: y\r\n'.repeat(3000), body: 'x' }, filePart())),
      [400],
    ],
    [
      'with a part of an unknown letter set',
      () =>
        requestOf(
          formOf(
            {
              ...fieldPart('a', 'x'),
              head: 'Content-Disposition: form-data; name="a"\r\nContent-Type: text/plain; charset=klingon',
            },
            filePart(),
          ),
        ),
      [200, 400],
    ],
    [
      'whose picture is written in base64',
      () =>
        requestOf(
          formOf({
            ...filePart('a.jpg', 'picture', photo.toString('base64')),
            head: `${filePart().head}\r\nContent-Transfer-Encoding: base64`,
          }),
        ),
      [415],
    ],
    [
      'that is said to be packed but is not',
      () => requestOf(form(), { headers: 'Content-Encoding: gzip\r\n' }),
      [200, 400, 415],
    ],
    [
      'that lies about its type inside',
      () =>
        requestOf(
          formOf({
            ...filePart(),
            head: 'Content-Disposition: form-data; name="picture"; filename="x.html"\r\nContent-Type: text/html',
          }),
        ),
      [200],
    ],
    [
      'with a page called a picture',
      () => requestOf(formOf(filePart('fish.jpg', 'picture', '<html><script>alert(1)</script>'))),
      [415],
    ],
    [
      'whose picture is too large',
      () => requestOf(formOf(filePart('a.jpg', 'picture', Buffer.alloc(MAX_BYTES + 1)))),
      [413],
    ],
    [
      'much larger than allowed',
      () => requestOf(formOf(filePart('a.jpg', 'picture', Buffer.alloc(3 * MAX_BYTES)))),
      [413],
    ],
  ])('%s is answered plainly', async (_what, make, statuses) => {
    const answer = await server.raw(make());
    expect(statuses, answer.slice(0, 400)).toContain(statusOf(answer));
    expect(answer).not.toMatch(/node_modules|\/tmp|multer|busboy|\n\s+at /i);
    if (statusOf(answer) !== 200) expect(server.stored()).toEqual([]);
  });

  test('hands its other fields on as they were typed', async () => {
    const typed = { caption: 'Weibchen №3 🐟', ['__proto__']: 'x' };
    const answer = await server.raw(
      requestOf(formOf(...Object.entries(typed).map(([name, value]) => fieldPart(name, value)), filePart())),
    );
    expect(statusOf(answer)).toBe(200);
    expect(Buffer.from(answer, 'latin1').toString('utf8')).toContain(
      '"fields":{"caption":"Weibchen №3 🐟","__proto__":"x"}',
    );
  });

  test('may hold a picture of exactly the size allowed', async () => {
    const padded = bytesOf(photo, Buffer.alloc(MAX_BYTES - photo.length));
    expect(statusOf(await server.raw(requestOf(formOf(filePart('a.jpg', 'picture', padded)))))).toBe(200);
  });
});
