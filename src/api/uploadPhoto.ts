import { errorBody } from '#shared/api/errors.ts';
import { addPhoto, photo, type Photo } from '#shared/api/photos.ts';
import { ApiError } from './ApiError.ts';
import { renewSession } from './renewSession.ts';
import { addressOf } from './sendRequest.ts';
import { readSession } from './sessionStore.ts';

interface Upload {
  petId: string;
  version: number;
  file: Blob;
  /** How much has gone, 0 to 1. */
  onShare: (share: number) => void;
}

/**
 * Sends one photo of a style's version. Through XMLHttpRequest, because `fetch` tells nothing of an
 * upload's progress. Renews access once when it has expired. Throws `ApiError`.
 */
export async function uploadPhoto(upload: Upload): Promise<Photo> {
  try {
    return await send(upload);
  } catch (error) {
    const expired = error instanceof ApiError && error.code === 'signInNeeded';
    if (!expired || (await renewSession()) === null) throw error;
    return send(upload);
  }
}

function send({ petId, version, file, onShare }: Upload): Promise<Photo> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open('POST', addressOf(addPhoto.path, { petId, version }, {}));
    request.setRequestHeader('Accept', 'application/json');
    const token = readSession()?.csrfToken;
    if (token) request.setRequestHeader('X-Furlong-Csrf', token);
    request.upload.onprogress = ({ loaded, total }) => onShare(total > 0 ? loaded / total : 0);
    request.onerror = () => reject(refusal(0, null));
    request.onload = () => {
      const content = readJson(request.responseText);
      const parsed = photo.safeParse(content);
      if (request.status < 300 && parsed.success) resolve(parsed.data);
      else reject(refusal(request.status, content));
    };
    const form = new FormData();
    form.append('photo', file, 'photo.jpg');
    request.send(form);
  });
}

function readJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

function refusal(status: number, content: unknown): ApiError {
  const parsed = errorBody.safeParse(content);
  if (parsed.success) {
    const { error } = parsed.data;
    const why = error.fields && Object.values(error.fields)[0];
    return new ApiError({ ...error, message: why ? `This photo ${why}.` : error.message, status });
  }
  return new ApiError({
    code: status === 0 ? 'offline' : 'broken',
    status,
    message:
      status === 0
        ? 'The photo did not go out. Check the network, then try again.'
        : `The server did not take the photo (${status}). Try a smaller one.`,
  });
}
