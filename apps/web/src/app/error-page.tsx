import { chakra } from '@chakra-ui/react';
import { isRouteErrorResponse, useRouteError } from 'react-router';
import { Button, ButtonLink } from '../components/button';
import { ProblemNotice } from '../components/problem-notice';
import { paths } from '../lib/paths';

/** Last resort of a route: says what happened and leads back. */
export function ErrorPage() {
  const error = useRouteError();
  if (isRouteErrorResponse(error) && error.status === 404) return <NotFoundPage />;
  return (
    <chakra.div p={{ base: '4', lg: '0' }} maxW="prose">
      <chakra.h1 mb="4">This page broke</chakra.h1>
      <ProblemNotice
        what="The page ran into an error of its own."
        safe="What was saved before is safe. What was typed and not saved is lost."
        todo="Load the page again. If it breaks again, tell the owner of the shop the address of this page and the time."
        actions={
          <>
            <Button kind="primary" onClick={() => globalThis.location.reload()}>
              Load the page again
            </Button>
            <ButtonLink to={paths.home}>Go to the start</ButtonLink>
          </>
        }
      />
    </chakra.div>
  );
}

export function NotFoundPage() {
  return (
    <chakra.div maxW="prose">
      <chakra.h1 mb="2">No such page</chakra.h1>
      <chakra.p mb="5">The address leads nowhere, or the record behind it belongs to another shop.</chakra.p>
      <ButtonLink to={paths.home} kind="primary">
        Go to the start
      </ButtonLink>
    </chakra.div>
  );
}
