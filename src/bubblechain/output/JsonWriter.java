package bubblechain.output;

import bubblechain.report.Block;
import bubblechain.report.Column;
import bubblechain.report.Fact;
import bubblechain.report.Facts;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.PrettyPrinter;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.core.util.MinimalPrettyPrinter;
import com.fasterxml.jackson.core.util.Separators;
import java.io.IOException;
import java.io.Writer;
import java.util.List;
import java.util.Map;

/**
 * Writes a report as one JSON object: program, version, command, request, normalisation, result, sources, cautions.
 *
 * <p>Decimal and exact numbers are strings, so that no reader rounds them; counts are integers. Absent values and
 * columns for reading only are left out. A value with a unit is followed by an entry of the same name with
 * {@code _unit} added. The schema is {@code schema/report.schema.json} beside this class.
 */
public final class JsonWriter implements ReportWriter {
    private final boolean pretty;

    private JsonWriter(boolean pretty) {
        this.pretty = pretty;
    }

    /** Indented by two spaces. */
    public static JsonWriter pretty() {
        return new JsonWriter(true);
    }

    /** The whole report on one line, for streams of reports. */
    public static JsonWriter compact() {
        return new JsonWriter(false);
    }

    @Override
    public void write(Report report, Writer out) throws IOException {
        JsonFactory factory = new JsonFactory();
        factory.disable(JsonGenerator.Feature.AUTO_CLOSE_TARGET);
        factory.disable(JsonGenerator.Feature.FLUSH_PASSED_TO_STREAM);
        try (JsonGenerator json = factory.createGenerator(out)) {
            json.setPrettyPrinter(pretty ? indenting() : new MinimalPrettyPrinter());
            envelope(json, report);
        }
        out.write('\n');
    }

    private static PrettyPrinter indenting() {
        Separators separators = Separators.createDefaultInstance()
                .withObjectFieldValueSpacing(Separators.Spacing.AFTER)
                .withObjectEmptySeparator("")
                .withArrayEmptySeparator("");
        DefaultIndenter indenter = new DefaultIndenter("  ", "\n");
        return new DefaultPrettyPrinter(separators).withObjectIndenter(indenter).withArrayIndenter(indenter);
    }

    private static void envelope(JsonGenerator json, Report report) throws IOException {
        json.writeStartObject();
        text(json, "program", "bubblechain");
        text(json, "version", ProgramVersion.text());
        text(json, "command", report.command());
        json.writeObjectFieldStart("request");
        for (Map.Entry<String, String> option : report.request().entrySet()) {
            text(json, PlainText.clean(option.getKey()), option.getValue());
        }
        json.writeEndObject();
        text(json, "normalisation", report.normalisation());
        json.writeObjectFieldStart("result");
        for (Block block : report.blocks()) {
            block(json, block);
        }
        json.writeEndObject();
        texts(json, "sources", report.sources());
        texts(json, "cautions", report.cautions());
        json.writeEndObject();
    }

    private static void text(JsonGenerator json, String key, String text) throws IOException {
        json.writeStringField(key, PlainText.clean(text));
    }

    private static void texts(JsonGenerator json, String key, List<String> texts) throws IOException {
        json.writeArrayFieldStart(key);
        for (String text : texts) {
            json.writeString(PlainText.clean(text));
        }
        json.writeEndArray();
    }

    private static void block(JsonGenerator json, Block block) throws IOException {
        if (block instanceof Table table) {
            json.writeFieldName(table.key());
            rows(json, table);
        } else if (block instanceof Facts facts && facts.key().isEmpty()) {
            facts(json, facts);
        } else if (block instanceof Facts facts) {
            json.writeObjectFieldStart(facts.key());
            facts(json, facts);
            json.writeEndObject();
        }
    }

    private static void facts(JsonGenerator json, Facts facts) throws IOException {
        for (Fact fact : facts.facts()) {
            if (!(fact.value() instanceof Value.Absent)) {
                json.writeFieldName(fact.key());
                value(json, fact.value());
                unit(json, fact.unitKey(), fact.unit());
            }
        }
    }

    private static void unit(JsonGenerator json, String key, String unit) throws IOException {
        if (!unit.isEmpty()) {
            text(json, key, unit);
        }
    }

    private static void rows(JsonGenerator json, Table table) throws IOException {
        json.writeStartArray();
        for (List<Value> row : table.rows()) {
            json.writeStartObject();
            for (int c = 0; c < row.size(); c++) {
                Column column = table.columns().get(c);
                if (column.place().inData() && !(row.get(c) instanceof Value.Absent)) {
                    json.writeFieldName(column.key());
                    value(json, row.get(c));
                    unit(json, column.unitKey(), column.unit());
                }
            }
            json.writeEndObject();
        }
        json.writeEndArray();
    }

    private static void value(JsonGenerator json, Value value) throws IOException {
        if (value instanceof Value.Text text) {
            json.writeString(PlainText.clean(text.text()));
        } else if (value instanceof Value.Numeral numeral) {
            json.writeString(numeral.decimal());
        } else if (value instanceof Value.Exact exact) {
            json.writeString(PlainText.clean(exact.formula()));
        } else if (value instanceof Value.Count count) {
            json.writeNumber(count.count());
        } else if (value instanceof Value.Flag flag) {
            json.writeBoolean(flag.set());
        } else if (value instanceof Value.Rows rows) {
            rows(json, rows.table());
        } else if (value instanceof Value.Group group) {
            json.writeStartObject();
            facts(json, group.facts());
            json.writeEndObject();
        } else if (value instanceof Value.Listing listing) {
            json.writeStartArray();
            for (Value entry : listing.values()) {
                value(json, entry);
            }
            json.writeEndArray();
        } else {
            json.writeNull();
        }
    }
}
