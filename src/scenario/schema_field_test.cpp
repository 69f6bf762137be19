#include <string>

#include "rainledger/scenario/field_test_file.hpp"
#include "scenario/schema_values.hpp"
#include "scenario/words.hpp"

// The JSON Schema of the YAML of field tests, for editors.
namespace rainledger {
namespace {

Json ring_schema() {
    return closed({{"inner_diameter", quantity(Dimension::depth, "Of the inner ring, above zero.")},
                   {"outer_diameter",
                    quantity(Dimension::depth, "Of the outer ring. Without it, a single ring.")}},
                  {"inner_diameter"});
}

Json laws_schema() {
    return {
        {"type", "array"}, {"items", words(kFittedLaws)}, {"minItems", 1}, {"uniqueItems", true}};
}

Json only_word(std::string_view word) {
    return Json::object({{"const", word}});
}

Json steady_rate_schema() {
    return closed(
        {{"use", described(only_word(kFitted), "Fitted with the other parameters.")},
         {"fixed", quantity(Dimension::rate, "Held at this rate.")},
         {"from", described(only_word(kTail), "Held at the mean rate of the test's steady end.")}},
        {}, one_required({"use", "fixed", "from"}));
}

}  // namespace

std::string field_test_schema() {
    Json schema = {{"$schema", "https://json-schema.org/draft/2020-12/schema"},
                   {"title", "rainledger field test"},
                   {"description", "An infiltration test, and how it is to be fitted."}};
    schema.update(closed(
        {{"title", described(shown_text(), "Title of the results. Default the file's name.")},
         {"readings", described(text(), "The CSV file of the readings, relative to this file.")},
         {"ring", described(reference("ring"), "The rings; volumes need the inner one.")},
         {"laws", described(laws_schema(), "The laws to fit. Default all.")},
         {"steady_rate",
          described(reference("steady_rate"), "Where Horton's fc comes from. Default fitted.")},
         {"ignore_first", quantity(Dimension::time, "Time left out at the start. Default 0.")},
         {"design_factor",
          described(number({{"minimum", 1}}), "Divides every rate for design. Default 1: none.")}},
        {"readings"}));
    schema["$defs"] =
        Json::object({{"ring", ring_schema()}, {"steady_rate", steady_rate_schema()}});
    return schema.dump(2) + "\n";
}

}  // namespace rainledger
