import type { ServerResponse } from 'node:http';
import { authenticate, newAttempt, pay, type PaymentAnswer } from '../payments';
import type { SessionRecord } from '../store';
import type { World } from '../world';
import { readCardForm } from './card-form';
import type { Html } from './html';
import { authenticationPage, closedPage, document, NOTHING_KEPT, payPage, unknownPage } from './pages';
import { STYLE } from './style';

interface Visit {
  method: string;
  path: string;
  body: string;
  response: ServerResponse;
}

/** /pay/<session id> and /pay/<session id>/authenticate, by plain forms, without a script. */
export function answerHosted(world: World, { method, path, body, response }: Visit): void {
  if (path === '/pay/style.css') {
    response.writeHead(200, { 'content-type': 'text/css; charset=utf-8' }).end(STYLE);
    return;
  }
  const [, , id = '', step] = path.split('/');
  const record = world.store.shelves.sessions.get(id);
  if (!record || (step !== undefined && step !== 'authenticate')) {
    show(response, 404, 'No such payment', unknownPage());
    return;
  }
  const desk = new Desk(world, record, response);
  if (record.session.status !== 'open') desk.closed();
  else if (step === 'authenticate') desk.atTheBank(method, new URLSearchParams(body));
  else desk.atTheTill(method, new URLSearchParams(body));
  if (method === 'POST') world.save();
}

/** One visit to one session. */
class Desk {
  constructor(
    private readonly world: World,
    private readonly record: SessionRecord,
    private readonly response: ServerResponse,
  ) {}

  atTheTill(method: string, form: URLSearchParams): void {
    const { record, world } = this;
    if (method !== 'POST') return this.show('well', payPage({ record, kept: NOTHING_KEPT, wrong: {} }));
    const known = record.session.customer_details?.email ?? null;
    const read = readCardForm(form, known, new Date(world.clock.now()));
    if (!read.ok) return this.show('refused', payPage({ record, kept: read.kept, wrong: read.wrong }));
    const answer = pay(world, record, read.card, newAttempt(read.card, read, read.expiry));
    if (answer.kind !== 'refused') return this.goOn(answer);
    return this.show('refused', payPage({ record, kept: read.kept, wrong: {}, refusal: answer.sentence }));
  }

  atTheBank(method: string, form: URLSearchParams): void {
    const { record, world } = this;
    if (!record.attempt) return this.redirect(`/pay/${record.id}`);
    const outcome = form.get('outcome');
    if (method !== 'POST' || (outcome !== 'complete' && outcome !== 'fail'))
      return this.show('well', authenticationPage(record));
    const { email, name, card } = record.attempt;
    const answer = authenticate(world, record, outcome === 'complete');
    if (answer.kind !== 'refused') return this.goOn(answer);
    const kept = {
      email: email ?? '',
      name: name ?? '',
      last4: card.last4,
      expiry: `${String(card.expMonth).padStart(2, '0')} / ${String(card.expYear).slice(-2)}`,
    };
    return this.show('refused', payPage({ record, kept, wrong: {}, refusal: answer.sentence }));
  }

  closed(): void {
    this.show('well', closedPage(this.record.session, this.successUrl()));
  }

  private goOn(answer: PaymentAnswer): void {
    this.redirect(
      answer.kind === 'asks' ? `/pay/${this.record.id}/authenticate` : (this.successUrl() ?? `/pay/${this.record.id}`),
    );
  }

  private successUrl(): string | null {
    return this.record.session.success_url?.replaceAll('{CHECKOUT_SESSION_ID}', this.record.id) ?? null;
  }

  private redirect(location: string): void {
    this.response.writeHead(303, { location }).end();
  }

  /** A refusal is 200 too: it is the page's own news, and a browser logs other statuses as faults of the page. */
  private show(news: 'well' | 'refused', body: Html): void {
    const title = news === 'well' ? 'Test payment' : 'Error: test payment';
    show(this.response, 200, title, body, this.record.session.success_url);
  }
}

function show(response: ServerResponse, status: number, title: string, body: Html, shop: string | null = null): void {
  // A browser holds the redirect after a form to the same rule as the form, so the shop has to be named.
  const targets = ["'self'", ...(shop === null ? [] : [new URL(shop).origin])].join(' ');
  response.writeHead(status, {
    'content-type': 'text/html; charset=utf-8',
    'cache-control': 'no-store',
    'content-security-policy': `default-src 'none'; style-src 'self'; img-src data:; form-action ${targets}; base-uri 'none'; frame-ancestors 'none'`,
    'referrer-policy': 'no-referrer',
    'x-content-type-options': 'nosniff',
  });
  response.end(document(title, body));
}
