import { PageQuery } from '../../common/pagination/page';

export class ListPhotosQuery extends PageQuery {}
