import { text } from 'node:stream/consumers';
import { toEditRecord } from '../../domain/edit/edit-record.ts';
import { readEdit } from '../../domain/edit/read-edit.ts';
import { type EditRequest } from './edit-request.ts';

const { clipRates, ...asked } = JSON.parse(await text(process.stdin)) as EditRequest;
const read = readEdit(asked.text, { rate: asked.rate, clipRates: new Map(clipRates) });
process.stdout.write(JSON.stringify(read.ok ? { ok: true, value: toEditRecord(read.value) } : read));
