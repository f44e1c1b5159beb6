import { PageHeading } from '../../components/page-heading.tsx';
import { ActionsSection } from './actions-section.tsx';
import { DrawingSection } from './drawing-section.tsx';
import { FieldsSection } from './fields-section.tsx';
import { MessagesSection } from './messages-section.tsx';
import { TablesSection } from './tables-section.tsx';
import { TokensSection } from './tokens-section.tsx';
import { TypeSection } from './type-section.tsx';

/** Every part of the design system in every state. */
export function DesignPage() {
  return (
    <div className="sheet-width grid gap-12 py-8">
      <div className="grid gap-3">
        <PageHeading>The drawing office</PageHeading>
        <p className="measure text-lead">
          Paper, ink and hairlines. Colour is kept for sun and shade, and for what is not met; it
          never speaks alone.
        </p>
      </div>
      <TokensSection />
      <TypeSection />
      <ActionsSection />
      <FieldsSection />
      <MessagesSection />
      <TablesSection />
      <DrawingSection />
    </div>
  );
}
