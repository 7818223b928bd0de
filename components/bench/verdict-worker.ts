import { answerTo } from './verdict-handler';
import type { VerdictRequest } from './verdict-messages';

self.onmessage = (event: MessageEvent<VerdictRequest>) => self.postMessage(answerTo(event.data));
