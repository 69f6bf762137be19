#include "rainledger/report/caution.hpp"
#include "rainledger/report/lookup_report.hpp"
#include "report/json_rain.hpp"

namespace rainledger {
namespace {

void write_range(JsonWriter& json, std::string_view low, std::string_view high,
                 const std::optional<ValueRange>& range) {
    json.member(low, range ? std::optional(range->low) : std::nullopt);
    json.member(high, range ? std::optional(range->high) : std::nullopt);
}

void write_fault(JsonWriter& json, const std::optional<PrintedFault>& fault) {
    json.key("fault");
    if (!fault) {
        json.null();
        return;
    }
    json.begin_object();
    json.member("words", fault->words);
    json.member("corrected", fault->corrected);
    write_range(json, "corrected_low", "corrected_high", fault->corrected_range);
    json.end_object();
}

void write_value(JsonWriter& json, const ValueView& view) {
    json.key(view.key);
    json.begin_object();
    json.member("value", view.published.value);
    write_range(json, "low", "high", view.published.range);
    text_or_null(json, "printed_unit", view.printed_unit);
    write_fault(json, view.fault);
    json.end_object();
}

void write_provenance(JsonWriter& json, const Provenance& provenance) {
    const Source& source = *provenance.source;
    json.key("source");
    json.begin_object();
    json.member("author", source.author);
    json.member("title", source.title);
    json.member("year", source.year);
    text_or_null(json, "edition", source.edition);
    json.member("place", provenance.place);
    json.member("status", status_words(provenance.status));
    text_or_null(json, "remark", provenance.remark);
    json.end_object();
}

template <class Texts>
void write_texts(JsonWriter& json, std::string_view key, const Texts& texts) {
    json.key(key);
    json.begin_array();
    for (const auto& text : texts)
        json.value(std::string_view(text));
    json.end_array();
}

void write_row(JsonWriter& json, const RowView& row) {
    json.begin_object();
    json.member("name", row.name);
    json.key("values");
    json.begin_object();
    for (const ValueView& view : row.values)
        write_value(json, view);
    json.end_object();
    write_texts(json, "notes", row.notes);
    write_provenance(json, row.provenance);
    json.end_object();
}

void write_section(JsonWriter& json, const LookupSection& section) {
    json.begin_object();
    json.member("heading", section.heading);
    json.key("rows");
    json.begin_array();
    for (const RowView& row : section.rows)
        write_row(json, row);
    json.end_array();
    text_or_null(json, "answer", section.answer);
    write_texts(json, "lines", section.lines);
    text_or_null(json, "yaml", section.yaml);
    json.end_object();
}

}  // namespace

std::string lookup_json(std::span<const LookupSection> sections) {
    JsonWriter json;
    begin_results(json, {});
    json.key("sections");
    json.begin_array();
    for (const LookupSection& section : sections)
        write_section(json, section);
    json.end_array();
    end_results(json, lookup_warnings(sections), kLookupCaution);
    return std::move(json).take();
}

}  // namespace rainledger
