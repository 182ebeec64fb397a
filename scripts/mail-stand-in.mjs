import { SMTPServer } from 'smtp-server';
import { openLetterBox } from './mail/letter-box.mjs';
import { letterPages } from './mail/letter-pages.mjs';

/* Takes mail by SMTP on loopback instead of a real server and keeps it in a folder: node mail-stand-in.mjs FOLDER SMTP_PORT HTTP_PORT */

const [folder, smtpPort = '0', httpPort = '0'] = process.argv.slice(2);
const HOST = '127.0.0.1';
const LARGEST = 5 * 1024 * 1024;

const box = openLetterBox(folder);

const smtp = new SMTPServer({
  name: 'mail.localhost',
  banner: 'Footring stand-in',
  authOptional: true,
  disableReverseLookup: true,
  disabledCommands: ['AUTH', 'STARTTLS'],
  size: LARGEST,
  closeTimeout: 1000,
  onData(stream, session, done) {
    const chunks = [];
    stream.on('data', (chunk) => chunks.push(chunk));
    stream.on('end', () => {
      if (stream.sizeExceeded) return done(Object.assign(new Error('Too large'), { responseCode: 552 }));
      const { mailFrom, rcptTo } = session.envelope;
      box.keep({ from: mailFrom.address, to: rcptTo.map(({ address }) => address) }, Buffer.concat(chunks).toString('latin1'));
      return done();
    });
  },
});
smtp.on('error', () => undefined); // a caller that leaves in the middle is no reason to end

const pages = letterPages(box);
const listen = (server, port) => new Promise((resolve) => server.listen(Number(port), HOST, resolve));
await listen(smtp, smtpPort);
await listen(pages, httpPort);
process.stdout.write(`${JSON.stringify({ smtp: smtp.server.address().port, http: pages.address().port })}\n`);

for (const name of ['SIGTERM', 'SIGINT']) {
  process.once(name, () => {
    pages.closeAllConnections();
    pages.close();
    smtp.close(() => process.exit(0));
  });
}
