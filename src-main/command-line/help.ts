import { COLUMN_KEYS } from '../../shared-core/norms/column-keys.ts';

const COLUMN_NAMES = [COLUMN_KEYS.slice(0, 5), COLUMN_KEYS.slice(5, 8), COLUMN_KEYS.slice(8)]
  .map((names) => names.join(', '))
  .join(`,\n${' '.repeat(28)}`);

export const HELP = `normloom table FILE --score COL [options]   conversion tables of a cohort file
normloom differ FILE --score COL --ranks RANKFILE [options]
                                            how somebody's ranks were made from the same people
normloom press PROJECT --into FOLDER        booklet, workbook, csv, norm set and certificate of a project; the
                                            files of a released edition are held against those released
normloom release PROJECT --into FOLDER [--analyst NAME --checker NAME]
                                            the same files, and the edition frozen beside them for good
normloom read-back FILE… --against PROJECT  pressed files compared with the project, cell by cell
normloom compare OLD NEW [--format text|json]
                                            every printed cell and choice in which two projects differ
normloom erratum OLD NEW [options]          the erratum of an edition, with the people whom it concerns
normloom class LIST [--table TABLE] --into FOLDER [options]
                                            report of a class, its slips, workbook and csv; without a table,
                                            the order within the class
normloom queries PROJECT [--format text|json]
                                            what a proof-reader would ask, and what was answered
normloom --help | --version

Options of table and differ:
  --score COL               column that holds the raw scores
  --count COL               column that tells how many people stand in a row
  --weight COL              column of weights above 0
  --id COL                  column that names a person; of repeated ones the first row is kept
  --cluster COL             column of the schools, or other clusters, that people were drawn in; intervals and
                            standard errors are then those between clusters
  --by COL,COL              columns whose values make the groups, with a table each
  --scale MIN:MAX[:STEP]    attainable scores, such as 0:40 or -5:5:0.5; without it, those met in the file
  --low-is-good             low scores are the good ones: seconds, errors
  --missing A,B             texts that stand for a missing score

Options of table:
  --definition NAME         midpoint (default), at-or-below, below, plotting-position:A such as
                            plotting-position:3/8, or grouped:WIDTH
  --smooth METHOD           none (default), log-linear:C, kernel:H, log-linear:C+kernel:H or beta-binomial;
                            C is a degree from 1 to 10, auto (lowest BIC), aic or likelihood-ratio;
                            H is a bandwidth in raw-score points above 0, or auto
  --interval NAME           wilson (default), clopper-pearson or jeffreys: error of sampling
  --level PERCENT           confidence of intervals and bands, 50 to 99.9; default 95
  --reliability R           reliability of the test, 0 to 1, for the measurement band
  --bootstrap R             refits R drawn samples, method and degree, for intervals and standard errors
  --seed S                  whole number that the samples of the bootstrap start from; default 1
  --points P,P              percentile points of these proportions, from 0 to 1
  --point-definition NAME   type-1 to type-9, nearest-rank, grouped or inverse (default); several with commas
  --columns NAME,NAME       columns beside the rank: ${COLUMN_NAMES};
                            default stanine,t
  --format NAME             text (default), csv or json

Options of differ:
  --ranks RANKFILE          text file with one raw score and somebody's percentile rank a line
  --group VALUE,VALUE       the group that the ranks are of: one value for each column of --by
  --format NAME             text (default) or json

Options of release:
  --analyst NAME            who prepared the tables; without it, as the project is signed
  --checker NAME            who checked them: somebody else

Options of read-back:
  --against PROJECT         the project or edition that the files were pressed from
  --format NAME             text (default): a line for each cell that differs; or json

Options of erratum:
  --roster FILE             people with their raw scores, one a row; the erratum then names those it concerns
  --score COL               column that holds the raw scores
  --by COL,COL              columns of the group values; without it, called as in the projects
  --person COL              column of names or codes; without it, people are told by their row
  --cut RANK                also tells whose unrounded rank lies on another side of this percentile rank

Options of class:
  --table TABLE             project or released edition, or a text with a published table: a raw score or
                            range and its percentile rank a line
  --group VALUE,VALUE       the table for pupils whose row names no group: its values or its title
  --low-is-good             low scores are the good ones, where no project says so
  --codes                   codes in random order in place of names; key-to-codes.csv tells who has which
  --seed N                  whole number that the codes are drawn from, as secret as the key; default chance
  --summary                 counts and no pupils, with small cells left out
  --slips N                 a slip for each pupil, 1 to 4 to a page
  --title TEXT              what the class is called
  --date YYYY-MM-DD         day of testing
  --name COL,COL            columns of the list that hold the name, or code; without it, guessed
  --score COL, --by COL,COL, --status COL
                            columns of raw score, group values, and who was absent, not tested or excused
  --language NAME           en (default), de, es or fr

LIST is a text or a workbook, or a class saved by the program (*.normclass), whose own choices then stand.
What does not fit in a list is told with its lines, and nothing is written.
Columns are named as in the heading of the file; within a list, a name with a comma in it stands in double
quotes.
Wherever PROJECT, OLD or NEW stands, a project (*.normloom) or a released edition (*.normedition) is read.
stdout carries only the result, stderr what there is to say about it.
Exit codes: 0 done, 2 wrong usage, 3 the data were refused, or cells or files differ.
`;
