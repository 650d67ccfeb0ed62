import { Button, Page, Stack, Text } from '../../ui/index.ts';

export function NotFoundScreen() {
  return (
    <Page title="There is nothing at this address" narrow>
      <Stack gap={5} align="flex-start">
        <Text>The link may be mistyped, or what it led to belongs to a firm that you are not signed in to.</Text>
        <Button href="/" kind="primary">
          Go to the start
        </Button>
      </Stack>
    </Page>
  );
}
