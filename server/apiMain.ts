import { runProcess } from './runProcess';
import { startApi } from './startApi';

runProcess('api', startApi);
