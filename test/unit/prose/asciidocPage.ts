// A realistic AsciiDoc page with every construct that the reader knows, for the tests of the reader.

/** The page; its line breaks are `\n`. */
export const ASCIIDOC_PAGE = `// Keys of the buoy gateway
= Keys of the *buoy* gateway
Ada Harbour <ada@buoys.example>; Bo Keel
v1.2, 2024-02-03
:toc: left
:summary: Keys and \\
  their owners
:lang: en

[[keys]]
[.lead]
A gateway signs each message with its *access key*. Keep the key in the _vault_, never in
\`config.toml\`; see link:vault.adoc#store[how to store it,window=_blank] and <<rules,the rules>>.

ifdef::network[]
Every key has an owner.footnote:[The owner is a *person*, not a team.] Press kbd:[Ctrl+K] to open the list, or
menu:File[Keys > New]. The list is at https://buoys.example/keys_list?all=1 and has a btn:[Search] box.
endif::[]
ifndef::network[Keys are off.]
include::partial.adoc[]

== Rotating keys ==

.Rotate a key
[source,sh,subs="attributes+"]
----
buoy keys rotate --name {name} # <1>
----
<1> The name of the key.

WARNING: A lost key opens the whole network. Rotate it "\`at once\`".

[CAUTION]
.High voltage
====
Switch the mast off before you open the cabinet.

* Wait for five minutes.
** Then measure 🙂 again.
+
....
0 V
....

. [x] done task
====

[quote, Somebody, A letter]
____
Somebody wrote this in a letter long ago.
____

[glossary]
== Terms

buoy:: A float with a mast.
mast::
  The pole on a buoy.
+
It is H~2~O-proof and 漢字 naïve&#160;letters are allowed.

vault:::: Where keys rest.

.Fields
[%header,cols="1,2a,1m"]
|===
|Field |Meaning |Default

|name |Name of the \\| key
* item

 code | none
2+|wide cell image:x.png[A key] here
|last
|===

image::buoy.png[A buoy with a mast,title="The northern buoy"]

****
Old keys expire (((expiry)))after {days} days. ((Renewal)) is at {docs}/renew[the desk^]. Write to keys@buoys.example.
****

Underlined title
~~~~~~~~~~~~~~~~

 literal paragraph

\\*not bold* but **bo**ld, \`\`mo\`\`no, +pass+, pass:[<u>x</u>], stem:[x^2], [.role]#marked# and (C) signs. +
The last paragraph ends without a line break.`;
