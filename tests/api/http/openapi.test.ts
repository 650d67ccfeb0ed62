import { expect, test } from 'vitest';
import { describeApi } from '../../../apps/api/src/http/openapi.ts';
import { routes } from '../../../apps/api/src/routes.ts';

const document = describeApi(routes) as unknown as {
  paths: Record<string, Record<string, { summary: string; parameters?: { name: string }[]; requestBody?: object; security?: object[] }>>;
  components: { schemas: Record<string, object> };
};

test('describes every route that is served, and no other', () => {
  const described = Object.entries(document.paths).flatMap(([path, methods]) => Object.keys(methods).map((method) => `${method} ${path}`));
  expect(described.sort()).toEqual(routes.map(({ method, path }) => `${method} ${path.replace(/:(\w+)/g, '{$1}')}`).sort());
});

test('names each part of a path, what is sent, and who must be signed in', () => {
  const put = document.paths['/firms/{firmId}/campaigns/{campaignId}/measurements/{measurementId}']!.put!;
  expect(put.parameters!.map(({ name }) => name)).toEqual(['firmId', 'campaignId', 'measurementId']);
  expect(put.requestBody).toMatchObject({ required: true });
  expect(put.security).toEqual([{ session: [] }]);
  expect(document.paths['/verification/{code}']!.get!.security).toBeUndefined();
});

test('points at shapes by name, and to none that is missing', () => {
  const text = JSON.stringify(document);
  const named = [...text.matchAll(/#\/components\/schemas\/([^"]+)/g)].map(([, name]) => name!);
  expect(named.length).toBeGreaterThan(50);
  expect(named.filter((name) => !(name in document.components.schemas))).toEqual([]);
});

test('every parameter in a path has a schema that checks it', () => {
  const unchecked = routes.filter(({ path, params }) => /:(?!firmId)/.test(path) && params === undefined);
  expect(unchecked.map(({ path }) => path)).toEqual([]);
});
