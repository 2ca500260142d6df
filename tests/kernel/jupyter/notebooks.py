"""Runs a notebook by nbclient and prints its cells' outputs, or the error that stopped it, as JSON.

Called by notebooks.jupyter.test.ts with the notebook's path.
"""
import json
import os
import sys

import nbformat
from nbclient import NotebookClient
from nbclient.exceptions import CellExecutionError

path = sys.argv[1]
notebook = nbformat.read(path, as_version=4)
client = NotebookClient(
    notebook, timeout=120, kernel_name="hingebook", resources={"metadata": {"path": os.path.dirname(path)}}
)
answer = {}
try:
    client.execute()
except CellExecutionError as error:
    answer["error"] = {"ename": error.ename, "evalue": error.evalue, "text": str(error)}
nbformat.validate(notebook)
answer["cells"] = [c["outputs"] for c in notebook.cells if c.cell_type == "code"]
answer["counts"] = [c["execution_count"] for c in notebook.cells if c.cell_type == "code"]
print(json.dumps(answer))
