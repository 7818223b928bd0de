import type Stripe from 'stripe';
import { grouped, TEST_CARDS } from '../cards';
import { formatMoney } from '../money';
import type { SessionRecord } from '../store';
import type { Field, Kept, Wrong } from './card-form';
import { html, type Html } from './html';

export const NOTHING_KEPT: Kept = { email: '', expiry: '', name: '', last4: '' };

interface PayPage {
  record: SessionRecord;
  kept: Kept;
  wrong: Wrong;
  /** What the bank said to the last attempt. */
  refusal?: string;
}

export function payPage({ record, kept, wrong, refusal }: PayPage): Html {
  const { session, lines } = record;
  const total = money(session.amount_total, session.currency);
  const knownEmail = session.customer_details?.email;
  return html`<main class="wide">
    <section>
      <h1>Pay ${total}</h1>
      ${lineTable(session, lines)} ${back(session)}
    </section>
    <section class="till">
      <h2>Card</h2>
      ${problems(wrong, refusal)}
      <form method="post" action="/pay/${session.id}" novalidate>
        ${
          knownEmail
            ? html`<p>Receipt goes to <strong>${knownEmail}</strong></p>`
            : field('email', 'E-mail', { wrong, value: kept.email, type: 'email', autocomplete: 'email' })
        }
        ${field('number', 'Card number', { wrong, hint: numberHint(kept), inputmode: 'numeric', autocomplete: 'cc-number' })}
        <div class="pair">
          ${field('expiry', 'Good until', { wrong, value: kept.expiry, hint: 'Month / year, any date to come', inputmode: 'numeric', autocomplete: 'cc-exp' })}
          ${field('cvc', 'Security code', { wrong, hint: 'Any three digits', inputmode: 'numeric', autocomplete: 'cc-csc' })}
        </div>
        ${field('name', 'Name on the card', { wrong, value: kept.name, hint: 'May stay empty', autocomplete: 'cc-name' })}
        <button class="main" type="submit">Pay ${total}</button>
      </form>
    </section>
    <section>
      <h2>Test cards</h2>
      <ul class="cards">
        ${TEST_CARDS.map((card) => html`<li><code>${grouped(card.number)}</code> <span>${card.hint}</span></li>`)}
      </ul>
    </section>
  </main>`;
}

export function authenticationPage({ session, attempt }: SessionRecord): Html {
  return html`<main class="narrow">
    <section>
      <h1>Your bank asks: is it you?</h1>
      <p>
        ${money(session.amount_total, session.currency)} from the card ending in ${attempt?.card.last4}. A real bank
        would ask for a code here; this stand-in takes your word.
      </p>
      <form method="post" action="/pay/${session.id}/authenticate">
        <div class="row">
          <button class="main" type="submit" name="outcome" value="complete">Complete authentication</button>
          <button type="submit" name="outcome" value="fail">Fail authentication</button>
        </div>
      </form>
      ${back(session)}
    </section>
  </main>`;
}

export function closedPage(session: Stripe.Checkout.Session, successUrl: string | null): Html {
  const complete = session.status === 'complete';
  return html`<main class="narrow">
    <section>
      <h1>${complete ? 'This payment is complete' : 'This payment page has expired'}</h1>
      <p>
        ${
          complete
            ? `${money(session.amount_total, session.currency)} ${session.payment_status === 'paid' ? 'is paid' : 'is on its way'}. It cannot be paid a second time.`
            : 'Nothing was taken. Go back to the shop and start the payment again.'
        }
      </p>
      ${complete && successUrl ? html`<p><a href="${successUrl}">On to the shop</a></p>` : back(session)}
    </section>
  </main>`;
}

export function unknownPage(): Html {
  return html`<main class="narrow">
    <section>
      <h1>There is no such payment</h1>
      <p>The address is not one this stand-in has given out. Go back to the shop and start the payment again.</p>
    </section>
  </main>`;
}

export function document(title: string, body: Html): string {
  return html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>${title}</title>
        <link rel="stylesheet" href="/pay/style.css" />
        <link rel="icon" href="data:," />
      </head>
      <body>
        <header class="strip">Test payment page, a local stand-in. No money moves.</header>
        ${body}
      </body>
    </html>`.text;
}

function lineTable(session: Stripe.Checkout.Session, lines: Stripe.LineItem[]): Html {
  return html`<table>
    <caption>
      What you pay for
    </caption>
    <tbody>
      ${lines.map(
        (line) =>
          html`<tr>
            <th scope="row">
              ${line.description ?? ''}
              <span class="small">${line.quantity ?? 1} × ${money(line.price?.unit_amount, line.currency)}</span>
            </th>
            <td>${money(line.amount_total, line.currency)}</td>
          </tr>`,
      )}
    </tbody>
    <tfoot>
      <tr>
        <th scope="row">Total</th>
        <td>${money(session.amount_total, session.currency)}</td>
      </tr>
    </tfoot>
  </table>`;
}

interface FieldLook {
  wrong: Wrong;
  value?: string;
  hint?: string;
  type?: string;
  inputmode?: string;
  autocomplete: string;
}

function field(
  name: Field,
  label: string,
  { wrong, value = '', hint, type = 'text', inputmode = 'text', autocomplete }: FieldLook,
) {
  const fault = wrong[name];
  const described = [hint && `${name}-hint`, fault && `${name}-wrong`].filter(Boolean).join(' ');
  return html`<div class="field">
    <label for="${name}">${label}</label>
    <input
      id="${name}"
      name="${name}"
      type="${type}"
      inputmode="${inputmode}"
      value="${value}"
      autocomplete="${autocomplete}"
      ${described !== '' && html`aria-describedby="${described}"`}
      ${fault !== undefined && html`aria-invalid="true"`}
    />
    ${hint !== undefined && html`<span class="small" id="${name}-hint">${hint}</span>`}
    ${fault !== undefined && html`<p class="wrong" id="${name}-wrong">${fault}</p>`}
  </div>`;
}

function problems(wrong: Wrong, refusal: string | undefined): Html | undefined {
  const faults = Object.entries(wrong);
  if (refusal === undefined && faults.length === 0) return undefined;
  return html`<div class="panel" role="alert">
    ${refusal !== undefined && html`<p>${refusal}</p>`}
    ${faults.map(([name, fault]) => html`<p><a href="#${name}">${fault}</a></p>`)}
  </div>`;
}

function numberHint({ last4 }: Kept): string {
  return last4 === ''
    ? 'One of the test cards on this page'
    : `The last one ended in ${last4}. Enter the number again.`;
}

function back({ cancel_url }: Stripe.Checkout.Session): Html | undefined {
  return cancel_url === null
    ? undefined
    : html`<p class="back"><a href="${cancel_url}">Back to the shop without paying</a></p>`;
}

function money(minor: number | null | undefined, currency: string | null): string {
  return formatMoney(minor ?? 0, currency ?? 'eur');
}
