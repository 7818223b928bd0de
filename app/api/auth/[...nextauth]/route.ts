import { NextRequest } from 'next/server';
import { limitedText, problemResponse } from '@/app/endpoint';
import { refuseForeign } from '@/app/own-request';
import { answerAuth } from '@/services/people';

interface Context {
  params: Promise<{ nextauth: string[] }>;
}

/** A sign-in carries an address, a password and a code. */
const bodyLimit = 8_192;

export async function GET(request: Request, { params }: Context): Promise<Response> {
  return answerAuth(request, (await params).nextauth);
}

export async function POST(request: Request, { params }: Context): Promise<Response> {
  try {
    refuseForeign(request.headers);
    const body = await limitedText(request, bodyLimit);
    const { url, headers } = request;
    return await answerAuth(new NextRequest(url, { method: 'POST', headers, body }), (await params).nextauth);
  } catch (error) {
    return problemResponse(error);
  }
}
