import type { StepList } from '#shared/checklist/step';
import type { CircuitSpecification } from '#shared/plant/plant';
import { sha256OfText } from '#shared/sequences/sha256';
import type { Context } from '../database/transactions';
import { tableOf } from '../refrigerants/company-tables';
import type { RefrigerantsService } from '../refrigerants/refrigerants.service';
import { chooseTemplate } from './engine/choose-template';
import { expandTemplate } from './engine/expand-template';
import { loadShippedTemplates } from './engine/load-shipped-templates';
import { parseTemplate } from './engine/parse-template';
import type { TemplateDocument } from './engine/template-document';
import type { TemplatesRepository } from './templates.repository';

/** A company's checklists, and the steps that they make of a circuit. */
export class TemplatesService {
  /** Parsed versions by the hash of their source, which never changes. */
  private readonly parsed = new Map<string, TemplateDocument>();

  constructor(
    private readonly templates: TemplatesRepository,
    private readonly refrigerants: RefrigerantsService,
    private readonly shippedFolder: string,
  ) {}

  /** Gives a company its own copy of the shipped library; versions that it has already stay. */
  async adoptShippedLibrary(context: Context, companyId: string): Promise<void> {
    for (const { document, source } of loadShippedTemplates(this.shippedFolder)) {
      await this.templates.insertIfNew(context, {
        companyId,
        key: document.key,
        version: document.version,
        source,
        sourceHash: sha256OfText(source),
      });
    }
  }

  /**
   * The steps of each circuit, by the company's newest templates and the makers' tables that it works with now; `null`
   * where no template applies.
   */
  async expand(
    context: Context,
    companyId: string,
    specifications: readonly CircuitSpecification[],
  ): Promise<(StepList | null)[]> {
    const rows = await this.templates.findNewest(context, companyId);
    const documents = rows.map((row) => this.parse(row.source, row.sourceHash, `${row.key}.yaml`));
    const tables = await this.refrigerants.inUse(context, companyId);
    return specifications.map((specification) => {
      const makersTable = tableOf(tables, specification.system.refrigerant);
      const document = chooseTemplate(documents, specification, makersTable);
      return document && expandTemplate(document, specification, makersTable);
    });
  }

  private parse(source: string, hash: string, fileName: string): TemplateDocument {
    const known = this.parsed.get(hash);
    if (known) return known;
    const document = parseTemplate(source, fileName);
    this.parsed.set(hash, document);
    return document;
  }
}
