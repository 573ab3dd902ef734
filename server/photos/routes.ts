import { addPhoto, listPhotos, removePhoto, showPhoto } from '../../shared/photos/contract';
import type { Serve } from '../http/serve';
import { photoRows, removeOne, showOne, takePhoto } from './photos';

export function photoRoutes(serve: Serve): void {
  serve.work(addPhoto, (scope, _input, raw) => takePhoto(scope, raw));
  serve.read(listPhotos, async (scope, { query }) => ({ photos: await photoRows(scope, query) }));
  serve.read(showPhoto, (scope, { params }, raw) => showOne(scope, params, raw));
  serve.work(removePhoto, (scope, { params }) => removeOne(scope, params.photoId));
}
