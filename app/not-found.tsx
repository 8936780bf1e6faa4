import { StopPage } from '@/components/shell/stop-page';
import { LinkButton } from '@/components/ui/link-button';

export default function NotFound() {
  return (
    <StopPage
      title="There is no such page"
      actions={
        <LinkButton href="/projects" variant="action">
          All projects
        </LinkButton>
      }
    >
      <p>The address may be mistyped, or what stood here was removed.</p>
    </StopPage>
  );
}
