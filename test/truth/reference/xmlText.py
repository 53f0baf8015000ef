"""Reads XML files with expat: a JSON list of paths from standard input, each one's character data to standard output.

For every file, a list of [byte offset, byte length, names of the open elements], or a string with expat's complaint.
General entities are not expanded, so that offsets are those of the file.
"""

import json
import sys
from xml.parsers import expat


def character_data(path):
    with open(path, "rb") as file:
        source = file.read()
    parser = expat.ParserCreate()
    parser.UseForeignDTD(True)
    parser.buffer_text = False
    names = []
    found = []

    def text(data):
        encoded = data.encode()
        at = parser.CurrentByteIndex
        # What stands for something else, such as a character reference, is no text of the file.
        if source[at : at + len(encoded)] == encoded:
            found.append([at, len(encoded), " ".join(names)])

    parser.StartElementHandler = lambda name, _: names.append(name)
    parser.EndElementHandler = lambda _: names.pop()
    parser.CharacterDataHandler = text
    parser.DefaultHandler = lambda _: None
    try:
        parser.Parse(source, True)
    except expat.ExpatError as error:
        return str(error)
    return found


json.dump([character_data(path) for path in json.load(sys.stdin)], sys.stdout)
