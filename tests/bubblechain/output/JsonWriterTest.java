package bubblechain.output;

import static bubblechain.output.Samples.write;
import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class JsonWriterTest extends WriterContract {
    @Override
    ReportWriter writer() {
        return JsonWriter.pretty();
    }

    @Override
    void checkWellFormed(String output) throws IOException {
        checkEnvelope(JsonTree.object(output));
    }

    /** The envelope against the schema: required and allowed entries, types, and the command's required results. */
    private static void checkEnvelope(Map<String, Object> report) throws IOException {
        Map<String, Object> schema = schema();
        List<Object> required = JsonTree.list(schema.get("required"));
        assertThat(required).contains("program", "version", "result");
        assertThat(report.keySet()).hasSameElementsAs(required.stream().map(Object::toString).toList());
        Map<String, Object> properties = JsonTree.object(schema.get("properties"));
        report.forEach((key, value) -> {
            Map<String, Object> property = JsonTree.object(properties.get(key));
            if (property.containsKey("const")) {
                assertThat(value).isEqualTo(property.get("const"));
            } else {
                assertThat(JsonTree.typeOf(value)).as(key).isEqualTo(property.get("type"));
            }
        });
    }

    private static Map<String, Object> schema() throws IOException {
        try (InputStream in = JsonWriter.class.getResourceAsStream("schema/report.schema.json")) {
            return JsonTree.object(new String(in.readAllBytes(), StandardCharsets.UTF_8));
        }
    }

    @Override
    boolean shows(String output, String text) throws IOException {
        return JsonTree.strings(JsonTree.object(output)).contains(PlainText.clean(text));
    }

    @Override
    boolean isForReading() {
        return false;
    }

    @Test
    void theSampleHasTheRequiredResultsOfItsSchema() throws IOException {
        Map<String, Object> result = JsonTree.object(JsonTree.object(write(writer(), Samples.poles())).get("result"));
        Map<String, Object> definitions = JsonTree.object(schema().get("$defs"));
        Map<String, Object> poles = JsonTree.object(definitions.get("poles"));
        assertThat(result.keySet()).containsAll(JsonTree.list(poles.get("required")).stream().map(Object::toString).toList());
    }

    @Test
    void everyCommandNamedInTheSchemaHasADefinition() throws IOException {
        Map<String, Object> definitions = JsonTree.object(schema().get("$defs"));
        for (Object branch : JsonTree.list(schema().get("allOf"))) {
            Map<String, Object> then = JsonTree.object(JsonTree.object(branch).get("then"));
            Map<String, Object> result = JsonTree.object(JsonTree.object(then.get("properties")).get("result"));
            assertThat(definitions).containsKey(result.get("$ref").toString().replace("#/$defs/", ""));
        }
    }

    @Test
    void numbersAreStringsCountsAreIntegersAndUnitsFollow() {
        assertThat(write(writer(), Samples.poles())).isEqualTo("""
                {
                  "program": "bubblechain",
                  "version": "development",
                  "command": "poles",
                  "request": {
                    "kernel": "example",
                    "to": "2"
                  },
                  "normalisation": "f = sum c_n a^(n+1), a = beta0 alpha_s/(4 pi)",
                  "result": {
                    "poles": [
                      {
                        "u": "1/2",
                        "order": 1,
                        "certified": true,
                        "laurent": [
                          {
                            "power": -1,
                            "exact": "-2*exp(5/6)",
                            "value": "-4.6"
                          }
                        ]
                      },
                      {
                        "u": "2",
                        "order": 2,
                        "certified": false,
                        "operator": "condensate",
                        "laurent": [
                          {
                            "power": -1,
                            "value": "112.25"
                          }
                        ]
                      }
                    ],
                    "leading": {
                      "ambiguity": "0.125",
                      "ambiguity_unit": "GeV",
                      "strength": {
                        "K": "9.2"
                      }
                    }
                  },
                  "sources": [
                    "First source"
                  ],
                  "cautions": [
                    "First caution"
                  ]
                }
                """);
    }

    @Test
    void emptyObjectsAndArraysAreClosedAtOnce() {
        Table empty = Table.builder("t", "").column("c", "c").build();
        assertThat(write(writer(), Report.builder("test").add(empty).build()))
                .contains("\"request\": {},", "\"t\": []\n", "\"sources\": [],");
    }

    @Test
    void anAbsentEntryOfAListIsNull() {
        Table table = Table.builder("t", "").column("c", "c").row(Value.listing(Value.count(1), Value.absent())).build();
        assertThat(write(JsonWriter.compact(), Report.builder("test").add(table).build())).contains("{\"c\":[1,null]}");
    }

    @Test
    void theCompactFormIsOneLineWithTheSameContent() throws IOException {
        String compact = write(JsonWriter.compact(), Samples.poles());
        assertThat(compact.lines()).hasSize(1);
        assertThat(JsonTree.object(compact)).isEqualTo(JsonTree.object(write(writer(), Samples.poles())));
    }
}
