export { listCustomerPhotos, readCustomerPhoto } from './customer-photos.queries.ts';
export { checkPhotoFiles } from './photo-files.queries.ts';
export { eraseWalkRounds, removeErasedFiles } from './erase-customer.service.ts';
export { walkRoundRoutes } from './walk-round.routes.ts';
