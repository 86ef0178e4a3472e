#!/usr/bin/env python3
"""What the program writes for other programs, held against the published schemas by an independent
validator (python-jsonschema, JSON Schema 2020-12).

usage: schemas.py --check

Checks every spec of the project in full detail, those that are wrong included, and the selections of
a spec with a size left open.
"""

import json
import subprocess
import sys
from pathlib import Path

from jsonschema import Draft202012Validator

ROOT = Path(__file__).resolve().parents[2]
SELECT = """assembly "Hub on a shaft"
condition cold -30
condition hot 90 { shaft 15 K above }
part hub of aluminium_6082_t6 { bore = dia 42 ? }
part shaft of steel_c45 { seat = dia 42 h6 }
fit seat = shaft.seat in hub.bore { require "S-1" clearance 0 .. 0.110 }
"""


def written(arguments, text=None):
    command = ["cargo", "run", "--quiet", "--", *arguments, "--as", "json"]
    run = subprocess.run(command, cwd=ROOT, input=text, capture_output=True, text=True)
    if run.returncode == 101 or not run.stdout:
        sys.exit(f"{arguments}: status {run.returncode}\n{run.stderr}")
    return json.loads(run.stdout)


def violations(schema, document):
    schema = json.loads((ROOT / "docs" / "schema" / schema).read_text())
    Draft202012Validator.check_schema(schema)
    errors = Draft202012Validator(schema).iter_errors(document)
    return [f"{e.json_path}: {e.message[:300]}" for e in errors]


def main():
    if sys.argv[1:] != ["--check"]:
        sys.exit(__doc__)
    report = written(["check", "specs", "tests/bad", "--detail"])
    selections = written(["select", "-"], SELECT)
    found = violations("report.schema.json", report)
    found += violations("select.schema.json", selections)
    # A validator that finds nothing wrong anywhere would prove nothing.
    report["specs"][0]["findings"] = "none"
    if not violations("report.schema.json", report):
        found.append("a document with words for findings passes")
    for line in found[:20]:
        print(line)
    print(f"{len(report['specs'])} specs, {len(found)} violations")
    sys.exit(1 if found else 0)


main()
