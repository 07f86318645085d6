import { useParams } from 'react-router';
import { ButtonLink } from '../components/button';
import { Page } from '../components/page';
import { findSciencePage } from '../features/science/science-pages';
import { ScienceText } from '../features/science/science-text';
import { paths } from '../lib/paths';

const INDEX_CRUMB = { label: 'How the numbers are worked out' };

/** How the numbers are worked out: the index, or one page of it. */
export function Component() {
  const { page } = useParams();
  const found = findSciencePage(page);
  const crumbs = page === undefined ? [INDEX_CRUMB] : [{ ...INDEX_CRUMB, to: paths.scienceIndex }, { label: found?.title ?? page }];
  if (found === undefined)
    return (
      <Page title="No such page" crumbs={crumbs}>
        <p>There is no science page of this name. It may have been renamed; the index lists them all.</p>
        <p>
          <ButtonLink to={paths.scienceIndex} kind="primary">
            Open the index
          </ButtonLink>
        </p>
      </Page>
    );
  return (
    <Page title={found.title} crumbs={crumbs}>
      <ScienceText body={found.body} />
    </Page>
  );
}
