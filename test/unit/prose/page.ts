// A realistic Markdown page with every construct that the reader knows, for the tests of the reader.

/** The page; its line breaks are `\n`. */
export const PAGE = `---
title: "Keys of the buoy gateway"
description: >
  How a gateway gets its key,
  and when to rotate it.
lang: en
weight: 30
---

# Gateway keys {#keys}

A gateway signs each message with its **access key**. Keep the key in the *vault*, never in
\`config.toml\`; see [how to store it](../vault.md#store "Storing") and [the rules][r].

Setext heading with \`code\`
---------------------------

Every key has an owner. Press <kbd>Ctrl</kbd>+<kbd>K</kbd> to open the list, or write to
keys@buoys.example. The list is at https://buoys.example/keys_list?all=1 and has a search box.

> [!WARNING]
> A lost key opens the whole network. Rotate it at once.

> Somebody wrote this in a letter long ago.
> It has two lines.

1. Choose **New key**.
2. Enter a name 🙂 and choose the owner.

   The name can be changed later, with "a word or two of comment" in quotes.

   \`\`\`sh
   buoy keys new --name north

   buoy keys list
   \`\`\`

3. Copy the key: 漢字 and naïve letters are allowed&nbsp;in the name.

* item without a blank line
* [x] done task
  - nested item with ~~struck~~ text
  - another nested item

| Field | Meaning | Default |
|-------|:-------:|--------:|
| \`name\` | Name of the key | none |
| owner | Who answers for it, a \\| or b | *you* |

!!! danger "High voltage"
    Switch the mast off before you open the cabinet.

        indented code

    Then wait for five minutes.

=== "Linux"

    Install the package with your package manager.

:::caution Take care
The key is shown **once**.
:::

<details>
<summary>More</summary>

The details are read as Markdown.

</details>

<!-- a comment
with two lines -->

![A buoy with a mast](buoy.png) Figure one shows the mast.

{{< include "note.md" >}}

Old keys expire[^1] after ninety days. {% if beta %}Beta text{% endif %}

    indented code block

    with a blank line

[r]: https://buoys.example/rules "Rules"
[^1]: Unless the owner extends them.

The last paragraph ends without a line break.`;
