import { dropDatabase, makeDatabase } from './freshDatabase.ts';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import cookieParser from 'cookie-parser';
import express from 'express';
import request from 'supertest';
import { afterAll, afterEach, beforeAll, beforeEach } from 'vitest';
import { inBusiness, unsafeAcrossBusinesses } from '#server/db/database.ts';
import { answerErrors } from '#server/http/answerErrors.ts';
import { readActor } from '#server/http/sessionCookies.ts';
import { Business } from '#server/models/Business.ts';
import { Household } from '#server/models/Household.ts';
import { OutboxText } from '#server/models/OutboxText.ts';
import { Visit } from '#server/models/Visit.ts';
import { textRoutes } from '#server/routes/textRoutes.ts';
import { webhookRoutes } from '#server/routes/webhookRoutes.ts';
import { startingWeights } from '#server/services/accounts/startingWeights.ts';
import { currentFake, openCarriers } from '#server/services/texts/openCarriers.ts';
import { queueText } from '#server/services/texts/queueText.ts';
import { sendDueTexts } from '#server/services/texts/sendDueTexts.ts';
import { signWebhook } from '#server/sms/fake/signWebhook.ts';

const app = express();
app.use(webhookRoutes);
app.use(cookieParser());
app.use(express.json(), readActor);
app.use(textRoutes);
app.use(answerErrors);

export let server: Server;
export let origin: string;
export let carriers: Awaited<ReturnType<typeof openCarriers>>;
/** The business of the test running; a fresh one for each. */
export let business: Business;

/**
 * A database, the fake carrier and our webhooks on a loopback port, for each test of the file.
 */
export function useTexts(): void {
  beforeAll(async () => {
    await makeDatabase();
    server = await new Promise<Server>((resolve) => {
      const listening = app.listen(0, '127.0.0.1', () => resolve(listening));
    });
    origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  });
  afterAll(async () => {
    await new Promise((resolve) => server.close(resolve));
    await dropDatabase();
  });
  beforeEach(async () => {
    carriers = await openCarriers({
      origin,
      now: () => new Date(),
      source: {},
      folder: null,
      // Statuses move only when a test says `settle`.
      fakeStepMs: 3_600_000,
    });
    business = await makeBusiness();
  });
  afterEach(async () => {
    await carriers.close();
    // The ticker works for every business, so what a test leaves would be sent by the next.
    await unsafeAcrossBusinesses(() => OutboxText.destroy({ where: {} }));
  });
}

export const fake = () => currentFake()!;

export async function makeBusiness(): Promise<Business> {
  return Business.create({
    name: 'Saltmarsh',
    timeZone: 'Europe/Vaduz',
    currency: 'EUR',
    distanceUnit: 'km',
    weightUnit: 'kg',
    weights: startingWeights,
    createdAt: new Date(),
  });
}

export async function makeHousehold(fields: Partial<Household> = {}): Promise<Household> {
  return inBusiness(business.id, () =>
    Household.create({
      name: 'Adeyemi',
      addressLabel: '12 Quay Lane',
      lat: 1,
      lon: 2,
      accessNotes: '',
      handoverNotes: '',
      contactName: 'Ade',
      phone: `+1555${String(Math.floor(Math.random() * 1e7)).padStart(7, '0')}`,
      textsConsent: true,
      createdAt: new Date(),
      ...fields,
    }),
  );
}

export async function makeVisit(household: Household): Promise<string> {
  const visit = await inBusiness(business.id, () =>
    Visit.create({
      householdId: household.id,
      date: '2026-04-14',
      status: 'booked',
      allowed: [],
      note: '',
      forecast: {
        steps: [],
        work: { meanSeconds: 3600, varianceSeconds2: 0 },
        p10Seconds: 3600,
        p90Seconds: 3600,
        setUpSeconds: 0,
        cleanDownSeconds: 0,
        tankUse: [],
        needs: [],
        heaviestGrams: 9000,
        coatStyle: '',
      },
      modelVersion: 'test',
      createdAt: new Date(),
    }),
  );
  return visit.id;
}

type Extra = {
  petNames?: string[];
  visitId?: string;
  promiseVersion?: number;
  dueAt?: Date;
  until?: Date;
};

export function booked(household: Household, { petNames = ['Pip'], ...extra }: Extra = {}) {
  return {
    householdId: household.id,
    visitId: null,
    kind: 'booked' as const,
    promiseVersion: 1,
    fields: { petNames, date: '2026-04-14', promise: { from: '9:30', to: '11:30' } },
    now: new Date(),
    ...extra,
  };
}

export async function queue(household: Household, extra: Extra = {}): Promise<OutboxText> {
  const text = await inBusiness(business.id, () => queueText(booked(household, extra)));
  await business.reload();
  return text;
}

export async function send(afterMs = 0, dice = () => 0.5): Promise<number> {
  return sendDueTexts({ now: new Date(Date.now() + afterMs), dice, origin });
}

export async function rows(): Promise<OutboxText[]> {
  return unsafeAcrossBusinesses(() =>
    OutboxText.findAll({ where: { businessId: business.id }, order: ['createdAt', 'id'] }),
  );
}

export async function statuses(): Promise<string[]> {
  return (await rows()).map((row) => row.status);
}

export async function callBack(url: string, form: Record<string, string>, signature?: string) {
  return request(server)
    .post(url.slice(origin.length))
    .set('Host', new URL(origin).host)
    .set('X-Twilio-Signature', signature ?? signWebhook(fake().authToken, url, form))
    .type('form')
    .send(form);
}
