// A realistic page of MDX with every construct that the reader knows, for the tests of the reader.

/** The page; its line breaks are `\n`. */
export const MDX_PAGE = `---
title: Keys of the buoy gateway
---
import Tabs from '@theme/Tabs';
import { Fleet,
  Mast } from '../components';

export const limits = {
  days: 90,

  text: \`rotate \${'}'} every day\`,
};

# Gateway keys {#keys}

A gateway signs each message with its **access key** {/* not the API key */}and keeps it for {limits.days} days.
See <Link to="../vault.md">the *vault*</Link>, or press <kbd>Ctrl</kbd> + <Kbd>K</Kbd>.{' '}
The <code>key store</code> and the <Icon name="key" title="Key of the mast" /> are explained below.

<Tabs groupId="systems">
  <TabItem value="linux" label="For Linux">

    Install the package:

    \`\`\`sh
    buoy keys install
    \`\`\`

    1. Choose **New key**.
    2. Enter a name 🙂 and 漢字.

  </TabItem>
  <TabItem value="mac" label="For macOS">
        Text that stands far in
        goes on here.
        </TabItem>
</Tabs>

<Admonition type="danger" title="High voltage">

Switch the mast off before you open the cabinet.

</Admonition>

<Warning>Never open it under load.</Warning>

<table>
  <tbody>
    <tr><td>north mast</td><td>the *old* one</td></tr>
  </tbody>
</table>

{limits.list.map((day) => <li key={day}>Don't read this</li>)}

<CodeBlock title="A title of code">
no prose at all
</CodeBlock>

| Field | Meaning |
|-------|---------|
| owner | Who answers for <b>it</b> |

:::caution Take care
The key is shown {count > 1 ? 'twice' : 'once'}.
:::

> <Quote>
> It was said long ago.
> </Quote>

<!-- as older pages
have it -->

<Card
  title="Rotate a key"
  href={links.rotate}
>
  Every ninety days.
</Card>

The last paragraph ends without a line break.`;
