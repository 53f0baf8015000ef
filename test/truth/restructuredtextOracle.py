# The prose words of reStructuredText files by docutils, for restructuredtextOracle.test.ts: reads a JSON list of texts on
# standard input, writes for each the list of its words in the order of the document. Sphinx's directives and roles, which
# docutils does not know, are registered here by what Sphinx's documentation says of them.
import json
import re
import sys

from docutils import frontend, nodes, utils
from docutils.parsers import rst
from docutils.parsers.rst import Directive, directives, roles
from docutils.statemachine import StringList

WORD = re.compile(r"[^\W_]+")

SKIPPED = (
    nodes.comment, nodes.literal, nodes.literal_block, nodes.doctest_block, nodes.substitution_definition,
    nodes.substitution_reference, nodes.system_message, nodes.math, nodes.math_block, nodes.image, nodes.raw,
    nodes.footnote_reference, nodes.citation_reference, nodes.label, nodes.field_name, nodes.classifier,
    nodes.option_group, nodes.pending, nodes.attribution,
)

# Fields that say who, when, which and of what type.
DATA_FIELDS = set(
    "author authors organization contact address version status date copyright revision release orphan tocdepth"
    " nocomments nosearch no-search og type rtype vartype raises-type module sectionauthor codeauthor license licence"
    " maintainer email url".split()
)

# Docutils links known schemes only; an address of any scheme is no prose.
ADDRESS = re.compile(r"[A-Za-z][A-Za-z0-9+.-]*://[-_.!~*'()\[\];/:@&=+$,%#?{}A-Za-z0-9]+")


class AnyOptions(dict):
    def __getitem__(self, name):
        return lambda value: value

    def __bool__(self):
        return True


class Content(Directive):
    """A directive without arguments whose body is prose."""

    has_content = True
    option_spec = AnyOptions()

    def run(self):
        return self.shown([])

    def shown(self, before):
        node = nodes.container()
        node += before
        self.state.nested_parse(self.content, self.content_offset, node)
        return [node]

    def inline(self, text):
        children, _ = self.state.inline_text(text, self.lineno)
        return [nodes.paragraph(text, "", *children)]


class Described(Content):
    """The argument is code, the body prose."""

    optional_arguments = 1
    final_argument_whitespace = True


class Titled(Described):
    """The argument is a title."""

    def run(self):
        return self.shown(self.inline(self.arguments[0]) if self.arguments else [])


class Version(Described):
    """The argument is a version number and, perhaps, text."""

    def run(self):
        text = self.arguments[0] if self.arguments else ""
        return self.shown(self.inline(re.sub(r"^\S+\s*", "", text)))


class Nothing(Described):
    def run(self):
        return []


class TitleOnly(Titled):
    def run(self):
        return self.inline(self.arguments[0]) if self.arguments else []


class Captioned(Nothing):
    """Of code and lists of pages, the caption is shown (Sphinx, "Directives", `caption`)."""

    def run(self):
        return self.inline(self.options["caption"]) if "caption" in self.options else []


class Glossary(Content):
    """Terms at the margin, one a line; definitions indented below them."""

    def run(self):
        result = []
        body = StringList()
        lines = list(self.content.xitems()) + [("", 0, "end")]
        for source, offset, line in lines:
            if line.strip() == "" or line.startswith(" "):
                body.append(line, source, offset)
                continue
            if any(text.strip() for text in body):
                text, _, _ = body.get_indented()
                node = nodes.container()
                self.state.nested_parse(text, self.content_offset, node)
                result.append(node)
            body = StringList()
            if source and not line.startswith(".. "):
                result += self.inline(line.split(" : ")[0])
        return result


def register(names, kind):
    for name in names.split():
        directives.register_directive(name, kind)


register(
    "danger warning caution notice note tip hint important attention error seealso todo epigraph highlights pull-quote"
    " compound header footer hlist tabs tab-set", Content)
register("admonition topic sidebar tab group-tab tab-item grid-item-card card dropdown details", Titled)
register("versionadded versionchanged versionremoved deprecated", Version)
register("toctree code code-block sourcecode literalinclude graphviz", Captioned)
register("contents rubric centered title", TitleOnly)
register("glossary", Glossary)
register(
    "container class rst-class only ifconfig grid function method classmethod staticmethod attribute property data"
    " exception decorator module describe object option cmdoption confval envvar setting signal event control state"
    " program automodule autoclass autofunction automethod autoattribute autodata autoexception py:class py:method"
    " py:function py:attribute py:module py:data py:exception", Described)
register(
    "code-tab highlight include raw math parsed-literal productionlist"
    " testcode testoutput doctest prompt mermaid role default-role default-domain index tabularcolumns sectnum"
    " currentmodule codeauthor sectionauthor moduleauthor acks autosummary image meta", Nothing)


def text_role(name, rawtext, text, lineno, inliner, options={}, content=[]):
    return [nodes.inline(rawtext, utils.unescape(text))], []


def label_role(name, rawtext, text, lineno, inliner, options={}, content=[]):
    return [nodes.inline(rawtext, re.sub("&(.)", r"\1", utils.unescape(text)))], []


def code_role(name, rawtext, text, lineno, inliner, options={}, content=[]):
    return [nodes.literal(rawtext, utils.unescape(text))], []


def titled(text):
    match = re.match(r"^(.+?)\s*(?<!\x00)<([^<]*?)>$", text, re.DOTALL)
    return match and match.group(1)


def reference_role(name, rawtext, text, lineno, inliner, options={}, content=[]):
    title = titled(text)
    return [nodes.inline(rawtext, utils.unescape(title)) if title else nodes.literal(rawtext, text)], []


def term_role(name, rawtext, text, lineno, inliner, options={}, content=[]):
    return [nodes.inline(rawtext, utils.unescape(titled(text) or text))], []


def object_role(name, rawtext, text, lineno, inliner, options={}, content=[]):
    # A text of several words for an object in code is prose; a single one is code.
    title = titled(text)
    if title and re.search(r"\s", title):
        return [nodes.inline(rawtext, utils.unescape(title))], []
    return [nodes.literal(rawtext, text)], []


def bare_role(name, rawtext, text, lineno, inliner, options={}, content=[]):
    # Deliberately apart from docutils: a single word between single marks, with no role, is mostly meant as code.
    kind = nodes.inline if re.search(r"\s", text) else nodes.literal
    return [kind(rawtext, utils.unescape(text))], []


OBJECTS = "mod func class meth attr exc data const obj option envvar setting signal confval event control state"
for role in "index abbr dfn ac".split():
    roles.register_local_role(role, text_role)
for role in "guilabel menuselection".split():
    roles.register_local_role(role, label_role)
roles.register_local_role("kbd", text_role)
for role in "ref doc any numref download".split():
    roles.register_local_role(role, reference_role)
roles.register_local_role("term", term_role)
for role in OBJECTS.split():
    roles.register_local_role(role, object_role)
    roles.register_local_role("py:" + role, object_role)
for role in (
    "file command program code samp literal math sig manpage pep rfc RFC keyword makevar mimetype newsgroup regexp token"
    " issue pr pypi github_user raw"
).split():
    roles.register_local_role(role, code_role)


def words_of(node, found):
    if isinstance(node, nodes.Text):
        found.extend(WORD.findall(ADDRESS.sub(" ", node.astext())))
        return
    if isinstance(node, SKIPPED):
        return
    if isinstance(node, nodes.field):
        name = node[0].astext().split(" ")[0].lower()
        if name in DATA_FIELDS:
            return
    if isinstance(node, nodes.reference) and node.get("refuri", "") in (node.astext(), "mailto:" + node.astext()):
        return
    for child in node.children:
        words_of(child, found)


def read(text):
    settings = frontend.get_default_settings(rst.Parser)
    settings.report_level = 5
    settings.halt_level = 6
    settings.file_insertion_enabled = False
    document = utils.new_document("text", settings)
    # The parser forgets the default role behind each document.
    roles.register_local_role("", bare_role)
    rst.Parser().parse(text, document)
    found = []
    words_of(document, found)
    return found


import time

sources = json.load(sys.stdin)
started = time.perf_counter()
results = [read(text) for text in sources]
json.dump({"words": results, "seconds": time.perf_counter() - started}, sys.stdout)
