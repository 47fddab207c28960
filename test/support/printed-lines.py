"""Runs a block of printed lines and reports, for each statement that ends in "# numbers", what it gave:
line <tab> values <tab> printed. Usage: python3 printed-lines.py FILE"""

import ast
import sys

with open(sys.argv[1], encoding="utf-8") as file:
    text = file.read()
lines = text.splitlines()
world = {}
for node in ast.parse(text).body:
    source = ast.get_source_segment(text, node)
    if isinstance(node, ast.Expr):
        value = eval(source, world)
    else:
        exec(source, world)
        value = world[node.targets[0].id] if isinstance(node, ast.Assign) else None
    last = lines[node.end_lineno - 1]
    if "  # " not in last:
        continue
    printed = last.rsplit("  # ", 1)[1].split()
    try:
        [float(number) for number in printed]
    except ValueError:
        continue
    values = value if isinstance(value, list) else [value]
    print(last, " ".join(repr(float(one)) for one in values), " ".join(printed), sep="\t")
