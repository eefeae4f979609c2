import { expose } from 'comlink';
import { modellingApi } from './modellingApi.ts';

expose(modellingApi);
