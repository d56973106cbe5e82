import { POST as postFit, GET as getFits } from '@/app/api/fits/route';
import { GET as getFile } from '@/app/api/files/[id]/route';
import { GET as getScan, PATCH as patchScan } from '@/app/api/scans/[id]/route';
import { GET as getScans, POST as postScan } from '@/app/api/scans/route';
import { POST as postStopping } from '@/app/api/stopping-sets/route';
import { GET as getReady } from '@/app/readyz/route';
import { GET as getHealth } from '@/app/healthz/route';
import { jsonRoute } from '@/app/_server/json-route';
import type { RouteHandler } from '@/app/_server/answer-route';
import { listScans } from '@/db/access/scan/list-scans';
import { MAX_FILE_BYTES } from '@/lib/inversion/index';
import { sql } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';

import {
  scanInput,
  SCAN_META,
  SCAN_READING,
  STOPPING_META,
  STOPPING_READING,
} from '../support/data';
import { testData, type TestData } from '../support/data';
import { testDatabase } from '../support/database';
import { arrive, serveFrom } from '../support/next-request';
import { personWithTeam, type TestPerson } from '../support/people';

vi.mock('next/headers', async () => (await import('../support/next-request')).nextHeaders);

const ORIGIN = 'http://desk.example';
const SAME = { 'sec-fetch-site': 'same-origin' };
const MB = 1024 * 1024;

describe('routes', async () => {
  const database = await testDatabase();
  let analyst: TestPerson;
  let data: TestData;

  beforeAll(async () => {
    serveFrom(database);
    analyst = await personWithTeam(database);
    data = await testData(analyst);
  });
  beforeEach(() => arrive(analyst.sessionToken));

  async function call(
    handler: RouteHandler,
    request: Request,
    params: Record<string, string> = {},
  ) {
    const response = await handler(request, { params: Promise.resolve(params) });
    const isJson = response.headers.get('content-type')?.startsWith('application/json');
    const body = isJson ? await response.json() : await response.arrayBuffer();
    return { status: response.status, body, headers: response.headers };
  }

  const get = (path: string) => new Request(`${ORIGIN}${path}`);
  const send = (
    method: string,
    path: string,
    body: unknown,
    headers: Record<string, string> = SAME,
  ) =>
    new Request(`${ORIGIN}${path}`, {
      method,
      body: JSON.stringify(body),
      headers: { 'content-type': 'application/json', host: 'desk.example', ...headers },
    });

  function form(details: unknown, files: readonly [string, BlobPart][]): FormData {
    const body = new FormData();
    body.set('details', JSON.stringify(details));
    for (const [name, content] of files) body.append('file', new File([content], name));
    return body;
  }
  const upload = (path: string, body: BodyInit, headers: Record<string, string> = SAME) =>
    new Request(`${ORIGIN}${path}`, { method: 'POST', body, headers });

  const details = () => ({ sampleId: data.sampleId, meta: SCAN_META, reading: SCAN_READING });
  const scanFile = (): [string, BlobPart] => {
    const { source } = scanInput(data.sampleId);
    return [source.name, new Uint8Array(source.bytes)];
  };
  const scanCount = async () => (await listScans(await analyst.context(), {})).length;

  describe('answers', () => {
    it('a list and one row as JSON that nobody else may keep', async () => {
      const list = await call(getScans, get(`/api/scans?sampleId=${data.sampleId}`));
      expect(list).toMatchObject({ status: 200, body: [{ id: data.scanId }] });
      expect(list.headers.get('cache-control')).toBe('private, no-store');
      const one = await call(getScan, get('/api/scans/x'), { id: data.scanId });
      expect(one.body).toMatchObject({ id: data.scanId, points: expect.any(Array) });
    });

    it('with the status of the refusal and its words', async () => {
      const absent = await call(getScan, get('/api/scans/x'), { id: crypto.randomUUID() });
      expect(absent).toMatchObject({ status: 404, body: { error: { code: 'not_found' } } });
      const mistyped = await call(getScan, get('/api/scans/x'), { id: 'x' });
      expect(mistyped).toMatchObject({ status: 422, body: { error: { fields: { id: /./ } } } });
      arrive();
      const signedOut = await call(getFits, get('/api/fits'));
      expect(signedOut).toMatchObject({
        status: 401,
        body: { error: { code: 'unauthenticated' } },
      });
    });

    it('in general words to what was not foreseen', async () => {
      const failing = jsonRoute(async function secretVerb() {
        throw new Error('the password of the database is …');
      });
      const { status, body } = await call(failing, get('/x'));
      expect(status).toBe(500);
      expect(JSON.stringify(body)).not.toMatch(/password/);
      expect(body).toMatchObject({ error: { message: expect.stringMatching(/went wrong/) } });
    });

    it('with the original file under its own name', async () => {
      const file = (await call(getScan, get('/x'), { id: data.scanId })).body.file;
      const { body, headers } = await call(getFile, get('/x'), { id: file.id });
      expect(Buffer.from(body)).toEqual(Buffer.from(scanInput('').source.bytes));
      expect(headers.get('content-disposition')).toBe(
        'attachment; filename="scan-template.csv"; filename*=UTF-8\'\'scan-template.csv',
      );
      expect(headers.get('x-content-type-options')).toBe('nosniff');
    });
  });

  describe('take in', () => {
    it('a scan with its file, and typed points as JSON', async () => {
      const before = await scanCount();
      const sent = await call(postScan, upload('/api/scans', form(details(), [scanFile()])));
      expect(sent).toMatchObject({ status: 201, body: { id: expect.any(String) } });
      const point = { energyKeV: 2, value: 0.5, sigma: 0.1, enabled: true, note: '' };
      const source = { kind: 'typed', points: [point] };
      const typed = { sampleId: data.sampleId, meta: SCAN_META, source };
      expect(await call(postScan, send('POST', '/api/scans', typed))).toMatchObject({
        status: 201,
      });
      expect(await scanCount()).toBe(before + 2);
    });

    it('an edit, whose id is that of the address', async () => {
      const edit = {
        id: crypto.randomUUID(),
        meta: { ...SCAN_META, name: 'Renamed' },
        points: null,
      };
      const sent = await call(patchScan, send('PATCH', '/x', edit), { id: data.scanId });
      expect(sent).toMatchObject({ status: 200, body: { id: data.scanId } });
    });

    it('a stopping set of several files', async () => {
      const one = { delimiter: 'tab', decimal: 'point', energyKeV: null, skipLines: [] };
      const reading = { ...STOPPING_READING, implantedPerEnergy: null, files: [one, one] };
      const files: [string, BlobPart][] = [
        ['4keV.txt', '1\t5\n3\t6\n5\t1\n'],
        ['8keV.txt', '1\t2\n3\t6\n5\t4\n'],
      ];
      const body = form({ meta: STOPPING_META, reading }, files);
      expect(await call(postStopping, upload('/api/stopping-sets', body))).toMatchObject({
        status: 201,
      });
    });

    it('nothing that a file refuses, and say the row', async () => {
      const before = await scanCount();
      const body = form(details(), [['bad.csv', 'energy,value,sigma,note\n2,x,1,a\n']]);
      const sent = await call(postScan, upload('/api/scans', body));
      expect(sent.status).toBe(422);
      expect(Object.keys(sent.body.error.fields)).toEqual(['bad.csv, line 2, column 2']);
      expect(await scanCount()).toBe(before);
    });
  });

  describe('bound what they take in', () => {
    const big = (bytes: number) => new Uint8Array(bytes).fill(0x31);

    it('by the announced length, without reading', async () => {
      const request = upload('/api/scans', 'x', {
        ...SAME,
        'content-type': 'multipart/form-data; boundary=x',
        'content-length': String(100 * MB),
      });
      expect(await call(postScan, request)).toMatchObject({ status: 413 });
    });

    it('by what arrives, where no length is announced', async () => {
      let pulled = 0;
      const body = new ReadableStream<Uint8Array>({
        pull(controller) {
          pulled += 1;
          controller.enqueue(big(MB));
          if (pulled > 1000) controller.close();
        },
      });
      const request = new Request(`${ORIGIN}/api/scans`, {
        method: 'POST',
        body,
        headers: { ...SAME, 'content-type': 'multipart/form-data; boundary=x' },
        ...{ duplex: 'half' },
      });
      expect(await call(postScan, request)).toMatchObject({ status: 413 });
      expect(pulled).toBeLessThan(12);
    });

    it('by the size of each file', async () => {
      const body = form(details(), [['large.csv', big(MAX_FILE_BYTES + 1)]]);
      const sent = await call(postScan, upload('/api/scans', body));
      expect(sent).toMatchObject({
        status: 413,
        body: { error: { message: expect.stringMatching(/large\.csv.*5 MB/) } },
      });
    });

    it('by the number of files', async () => {
      const two = form(details(), [scanFile(), scanFile()]);
      expect(await call(postScan, upload('/api/scans', two))).toMatchObject({ status: 413 });
      const many = Array.from({ length: 201 }, (_, k): [string, BlobPart] => [
        `${k}keV.txt`,
        '1\t2',
      ]);
      const reading = { meta: STOPPING_META, reading: STOPPING_READING };
      const sent = await call(postStopping, upload('/api/stopping-sets', form(reading, many)));
      expect(sent).toMatchObject({ status: 413 });
    });

    it('by the size of a JSON body', async () => {
      const sent = await call(postFit, send('POST', '/api/fits', { notes: 'x'.repeat(5 * MB) }));
      expect(sent).toMatchObject({ status: 413 });
    });

    it('by its form: no file, no details, no JSON, no type, cut short', async () => {
      const noFile = upload('/api/scans', form(details(), []));
      const noDetails = new FormData();
      noDetails.append('file', new File(['1'], 'a.csv'));
      const multipart = { ...SAME, 'content-type': 'multipart/form-data; boundary=x' };
      for (const request of [
        noFile,
        upload('/api/scans', noDetails),
        upload('/api/scans', 'no multipart at all', multipart),
        upload('/api/scans', 'cut', { ...multipart, 'content-length': '2000' }),
        upload('/api/scans', '{', { ...SAME, 'content-type': 'application/json' }),
        upload('/api/scans', '[1]', { ...SAME, 'content-type': 'application/json' }),
        upload('/api/scans', '{}', { ...SAME, 'content-type': 'text/plain' }),
      ])
        expect(await call(postScan, request)).toMatchObject({ status: 422 });
    });
  });

  describe('carry out nothing that another site asks for', () => {
    const typed = () => ({ sampleId: data.sampleId, meta: SCAN_META, source: { kind: 'typed' } });

    it.each([
      ['Sec-Fetch-Site: cross-site', { 'sec-fetch-site': 'cross-site' }],
      ['Sec-Fetch-Site: same-site', { 'sec-fetch-site': 'same-site' }],
      ['a foreign Origin', { origin: 'http://evil.example' }],
      ['Origin: null', { origin: 'null' }],
    ])('%s', async (_, headers) => {
      const json = send('POST', '/api/scans', typed(), headers);
      expect(await call(postScan, json)).toMatchObject({ status: 403 });
      const multipart = upload('/api/scans', form(details(), [scanFile()]), headers);
      expect(await call(postScan, multipart)).toMatchObject({ status: 403 });
      expect(await call(patchScan, send('PATCH', '/x', {}, headers))).toMatchObject({
        status: 403,
      });
      expect(await call(postFit, send('POST', '/x', {}, headers))).toMatchObject({ status: 403 });
    });

    it('while their own origin may ask', async () => {
      const own = send('POST', '/api/scans', typed(), { origin: ORIGIN });
      expect((await call(postScan, own)).status).toBe(422);
    });
  });

  describe('tell how the server is', () => {
    it('running, ready, and not ready without its schema', async () => {
      expect(await getHealth().json()).toEqual({ status: 'fine' });
      const ready = await getReady();
      expect([ready.status, await ready.json()]).toEqual([
        200,
        { status: 'ready', pendingMigrations: 0 },
      ]);
      const empty = await testDatabase({ forTest: true, migrated: false });
      serveFrom(empty);
      expect((await getReady()).status).toBe(503);
      await empty.db.run(sql`create table __drizzle_migrations (id, hash, created_at)`);
      expect((await getReady()).status).toBe(503);
      serveFrom(database);
    });
  });
});
