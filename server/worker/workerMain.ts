import { runProcess } from '../runProcess';
import { startWorker } from './startWorker';

runProcess('worker', startWorker);
