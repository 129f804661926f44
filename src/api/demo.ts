import * as contract from '#shared/contracts/demo';
import { call } from '@/api/call';

export const listDemoPeople = () => call(contract.listDemoPeople, {});

export const listMails = () => call(contract.listMails, {});
