import { Link, useRouteError } from 'react-router-dom'
import { MessageCard } from '../ui/feedback/message-card.tsx'
import { Button } from '../ui/buttons/button.tsx'
import { PageTitle } from '../ui/page-title.tsx'

/** A page that could not be drawn or fetched; nothing typed is lost by reloading. */
export function PageFailed() {
  const error = useRouteError()
  const isNew = error instanceof TypeError && /import|module|fetch/i.test(error.message)
  return (
    <main id="main" className="mx-auto max-w-page px-gutter pt-12">
      <MessageCard role="alert" icon="warning" title={isNew ? 'There is a newer version of this page' : 'This page did not open'} action={<Button onClick={() => window.location.reload()}>Load it again</Button>}>
        {isNew ? 'Load it again to go on. What you typed is kept.' : `${error instanceof Error ? error.message : 'Something went wrong.'} Nothing is lost.`}
      </MessageCard>
    </main>
  )
}

/** An address that leads nowhere. */
export function NoSuchPage() {
  return (
    <>
      <PageTitle title="There is no such page" />
      <p>Check the address, or begin at <Link to="/">the first page</Link>.</p>
    </>
  )
}
