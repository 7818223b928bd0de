import { type AddressInfo, type Socket, createServer } from 'node:net';

/** What one message carried: who it was for on the envelope, and the text as it came over the wire. */
export interface Received {
  recipients: string[];
  data: string;
}

export interface PostOffice {
  port: number;
  received: Received[];
  /** Refuses the next n messages at the end of their text, as a full mailbox does. */
  refuseNext(count: number): void;
  close(): Promise<void>;
}

/** A mail server of forty lines that takes everything in and keeps it (RFC 5321, the little a sender needs). */
export async function openPostOffice(): Promise<PostOffice> {
  const received: Received[] = [];
  const sockets = new Set<Socket>();
  let refusals = 0;

  const server = createServer((socket) => {
    sockets.add(socket);
    let pending = '';
    let recipients: string[] = [];
    let text: string[] | null = null;
    const say = (line: string) => socket.write(`${line}\r\n`);
    say('220 post office');

    const take = (line: string): void => {
      if (text) {
        if (line !== '.') return void text.push(line.replace(/^\.\./, '.'));
        const data = text.join('\r\n');
        text = null;
        if (refusals > 0) {
          refusals--;
          say('452 no room for edda@home.example just now');
        } else {
          received.push({ recipients, data });
          say('250 kept');
        }
        recipients = [];
      } else if (/^(EHLO|HELO|MAIL FROM|RSET|NOOP)/i.test(line)) {
        say('250 ok');
      } else if (/^RCPT TO:/i.test(line)) {
        recipients.push(line.slice('RCPT TO:'.length));
        say('250 ok');
      } else if (/^DATA/i.test(line)) {
        text = [];
        say('354 go on');
      } else if (/^QUIT/i.test(line)) {
        say('221 bye');
        socket.end();
      } else say('500 what');
    };

    socket.on('data', (chunk) => {
      pending += chunk.toString('utf8');
      const lines = pending.split('\r\n');
      pending = lines.pop() ?? '';
      lines.forEach(take);
    });
    socket.on('error', () => undefined);
    socket.on('close', () => sockets.delete(socket));
  });

  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo; // listening on a port, not on a pipe
  return {
    port,
    received,
    refuseNext: (count) => {
      refusals = count;
    },
    close: () => {
      for (const socket of sockets) socket.destroy();
      return new Promise((resolve) => server.close(() => resolve()));
    },
  };
}
