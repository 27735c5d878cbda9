/** What stops the growth, in words. */
import { Card } from '#client/components/ui/card.tsx'
import type { GrowthStory } from '#client/features/start-up/lib/growth-story.ts'

export function GrowthCard({ story }: { story: GrowthStory }) {
  return (
    <Card className="px-4 py-3">
      <h2 className="text-base font-medium">{story.headline}</h2>
      <div className="mt-1 max-w-prose space-y-1 text-soft">
        {story.sentences.map((sentence) => (
          <p key={sentence}>{sentence}</p>
        ))}
      </div>
    </Card>
  )
}
