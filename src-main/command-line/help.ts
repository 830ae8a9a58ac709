import { COLUMN_KEYS } from '../../shared-core/norms/column-keys.ts';

export const HELP = `normloom table FILE --score COL [options]   conversion tables of a cohort file
normloom press PROJECT --into FOLDER        booklet.pdf, tables.xlsx, tables.csv and norm-set.json of a project
normloom --help | --version

Options of table:
  --score COL               column that holds the raw scores
  --count COL               column that tells how many people stand in a row
  --weight COL              column of weights above 0
  --id COL                  column that names a person; of repeated ones the first row is kept
  --by COL,COL              columns whose values make a table each
  --scale MIN:MAX[:STEP]    attainable scores, such as 0:40 or -5:5:0.5; without it, those met in the file
  --low-is-good             low scores are the good ones: seconds, errors
  --missing A,B             texts that stand for a missing score
  --definition NAME         midpoint (default), at-or-below, below, plotting-position:A such as
                            plotting-position:3/8, or grouped:WIDTH
  --points P,P              percentile points of these proportions, from 0 to 1
  --point-definition NAME   type-1 to type-9, nearest-rank, grouped or inverse (default); several with commas
  --columns NAME,NAME       columns beside the rank: ${COLUMN_KEYS.slice(0, 5).join(', ')},
                            ${COLUMN_KEYS.slice(5).join(', ')}; default stanine,t
  --format NAME             text (default), csv or json

Columns are named as in the heading of the file; a name with a comma in it stands in double quotes within the list.
stdout carries only the result, stderr what there is to say about it.
Exit codes: 0 done, 2 wrong usage, 3 the data were refused.
`;
