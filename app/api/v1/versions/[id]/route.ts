import { endpoint } from '@/app/endpoint';
import { readVersion } from '@/services/kits';

export const GET = endpoint({ deed: readVersion, input: (_request, params) => String(params['id']) });
