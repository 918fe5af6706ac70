"""The JSON Schema of a record's file, from the types and the limits. Run this file to write it anew."""

from __future__ import annotations

import json
import re
from pathlib import Path
from typing import Any

import msgspec

from fourcount.record.codec import FORMAT, MOST_OUTCOMES, MOST_STRATA
from fourcount.record.file.limits import LONGEST_TEXT
from fourcount.record.file.upgrades import FORMAT_KEY
from fourcount.record.paper import HIGHEST_LEVEL, LOWEST_LEVEL, Record

SCHEMA = Path(__file__).resolve().parents[1] / "assets" / "record.schema.json"
TEXT = {
    "type": "string",
    "maxLength": LONGEST_TEXT,
    "pattern": r"^[^\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u202a-\u202e\u2066-\u2069]*$",
    "default": "",
}
"""Every text of a record: as typed, without controls but tab and line breaks, and without overrides of direction."""

Schema = dict[str, Any]


def schema() -> Schema:
    """The schema as it has to stand in the assets."""
    definitions = msgspec.json.schema(Record)["$defs"]
    for definition in definitions.values():
        definition["description"] = " ".join(definition["description"].split())
        for name, field in definition["properties"].items():
            if name.endswith("_text"):
                definition["properties"][name] = TEXT
            field.pop("discriminator", None)
    record = definitions.pop("Record")
    record["properties"]["outcomes"] |= {"minItems": 1, "maxItems": MOST_OUTCOMES}
    record["properties"]["outcomes"].pop("default")
    definitions["Strata"]["properties"]["strata"] |= {"minItems": 1, "maxItems": MOST_STRATA}
    definitions["Choices"]["properties"]["level"] |= {"minimum": LOWEST_LEVEL, "maximum": HIGHEST_LEVEL}
    return {
        "$schema": "https://json-schema.org/draft/2020-12/schema",
        "title": "Fourcount record",
        "description": f"{record['description']} One JSON object in UTF-8, at most ten megabytes, no key twice.",
        "type": "object",
        "properties": {FORMAT_KEY: {"const": FORMAT}, **record["properties"]},
        "required": [FORMAT_KEY, "outcomes"],
        "additionalProperties": False,
        "$defs": dict(sorted(definitions.items())),
    }


def written(made: Schema) -> str:
    """The schema as it stands in its file."""
    return json.dumps(made, indent=2, ensure_ascii=False) + "\n"


def faults(value: Any, part: Schema, whole: Schema) -> list[str]:
    """Why a value does not keep to a schema: the words that a record's schema uses, and no others, are understood."""
    if "$ref" in part:
        return faults(value, whole["$defs"][part["$ref"].rpartition("/")[2]], whole)
    if "anyOf" in part:
        tried = [faults(value, each, whole) for each in part["anyOf"]]
        return [] if [] in tried else min(tried, key=len)
    if "const" in part:
        return [] if value == part["const"] and type(value) is type(part["const"]) else ["const"]
    if "enum" in part:
        return [] if isinstance(value, str) and value in part["enum"] else ["enum"]
    return FAULTS[part["type"]](value, part, whole)


def _of_object(value: Any, part: Schema, whole: Schema) -> list[str]:
    if not isinstance(value, dict):
        return ["object"]
    missing = [f"required {name}" for name in part.get("required", ()) if name not in value]
    unknown = [f"unknown {name}" for name in value if name not in part["properties"]]
    known = [(each, part["properties"][name]) for name, each in value.items() if name in part["properties"]]
    return missing + unknown + [fault for each, below in known for fault in faults(each, below, whole)]


def _of_array(value: Any, part: Schema, whole: Schema) -> list[str]:
    if not isinstance(value, list) or not part["minItems"] <= len(value) <= part["maxItems"]:
        return ["array"]
    return [fault for each in value for fault in faults(each, part["items"], whole)]


def _of_string(value: Any, part: Schema, whole: Schema) -> list[str]:
    held = isinstance(value, str) and len(value) <= part["maxLength"] and re.fullmatch(part["pattern"], value)
    return [] if held else ["string"]


def _of_number(value: Any, part: Schema, whole: Schema) -> list[str]:
    held = isinstance(value, int | float) and not isinstance(value, bool)
    return [] if held and part["minimum"] <= value <= part["maximum"] else ["number"]


def _of_boolean(value: Any, part: Schema, whole: Schema) -> list[str]:
    return [] if isinstance(value, bool) else ["boolean"]


FAULTS = {
    "object": _of_object,
    "array": _of_array,
    "string": _of_string,
    "number": _of_number,
    "boolean": _of_boolean,
}

if __name__ == "__main__":
    SCHEMA.write_text(written(schema()), encoding="utf-8")
