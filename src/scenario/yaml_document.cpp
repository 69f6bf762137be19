#include "scenario/yaml_document.hpp"

#include <algorithm>
#include <array>
#include <sstream>
#include <string>
#include <string_view>
#include <vector>

#include <yaml-cpp/eventhandler.h>

#include "rainledger/base/cut.hpp"
#include "scenario/plain_text.hpp"

namespace rainledger {
namespace {

constexpr const char* kLookAround =
    "look at the indentation, colons, quotes and brackets here and just before";

struct PlainWords {
    std::string_view parser;
    std::string_view plain;
};

/// What the YAML library's messages mean to somebody who has never heard of flows and anchors.
constexpr auto kPlainWords = std::to_array<PlainWords>({
    {"illegal map value", "this colon follows nothing that can be a key"},
    {"illegal map key", "no key can stand here"},
    {"illegal block entry", "no list entry can stand here"},
    {"illegal flow end", "this closing bracket has no opening one"},
    {"end of sequence flow not found", "a list opened with '[' is not closed"},
    {"end of map flow not found", "a map opened with '{' is not closed"},
    {"end of map not found", "this line is not in line with the keys above it"},
    {"end of sequence not found", "this line is not in line with the list above it"},
    {"illegal EOF in scalar", "a quote is not closed"},
    {"illegal document indicator in scalar", "a quote is not closed"},
    {"the referenced anchor is not defined", "'*' refers to a name that no '&' defines"},
    {"unknown token", "no value can begin with this character; put it in quotes"},
    {"bad file", "maps or lists are nested too deeply"},
});

std::string in_plain_words(const std::string& message) {
    for (const PlainWords& words : kPlainWords)
        if (words.parser == message) return std::string(words.plain);
    return message;
}

constexpr std::string_view kCoreTag = "tag:yaml.org,2002:";
constexpr auto kPlainTags =
    std::to_array<std::string_view>({"str", "int", "float", "bool", "map", "seq"});

/// Whether a tag says no more than the text does: none, that of quotes, or one of the core.
bool is_plain(std::string_view tag) {
    if (tag.empty() || tag == "?" || tag == "!") return true;
    return tag.starts_with(kCoreTag) &&
           std::ranges::find(kPlainTags, tag.substr(kCoreTag.size())) != kPlainTags.end();
}

/// Follows a parser through its documents, keeping where the last one began and where tags stand.
class DocumentStarts : public YAML::EventHandler {
public:
    void OnDocumentStart(const YAML::Mark& mark) override { last_ = mark; }
    void OnDocumentEnd() override {}
    void OnNull(const YAML::Mark&, YAML::anchor_t) override {}
    void OnAlias(const YAML::Mark&, YAML::anchor_t) override {}
    void OnScalar(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t,
                  const std::string&) override {
        note(mark, tag);
    }
    void OnSequenceStart(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t,
                         YAML::EmitterStyle::value) override {
        note(mark, tag);
    }
    void OnSequenceEnd() override {}
    void OnMapStart(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t,
                    YAML::EmitterStyle::value) override {
        note(mark, tag);
    }
    void OnMapEnd() override {}

    [[nodiscard]] const YAML::Mark& last() const { return last_; }
    [[nodiscard]] const std::vector<YAML::Mark>& tags() const { return tags_; }

private:
    void note(const YAML::Mark& mark, const std::string& tag) {
        if (!is_plain(tag)) tags_.push_back(mark);
    }

    YAML::Mark last_;
    std::vector<YAML::Mark> tags_;
};

/// Walks the first document and to where a second begins, if there is one. Asked of the parser and
/// not of YAML::LoadAll, which never ends on a stray comma: the parser goes on offering it as one
/// more empty document.
std::optional<YAML::Mark> second_document(const std::string& text, std::vector<YAML::Mark>& tags) {
    std::istringstream stream(text);
    YAML::Parser parser(stream);
    DocumentStarts starts;
    const bool has_first = parser.HandleNextDocument(starts);
    tags = starts.tags();
    if (!has_first || !parser.HandleNextDocument(starts)) return std::nullopt;
    return starts.last();
}

/// The column of a tab in a line's indentation.
std::optional<std::size_t> tab_of_indentation(std::string_view line) {
    const std::size_t tab = line.find('\t');
    if (tab == std::string_view::npos || line.find_first_not_of(' ') != tab) return std::nullopt;
    return tab;
}

std::string_view without_indentation(std::string_view line) {
    const std::size_t begin = line.find_first_not_of(" \t");
    return begin == std::string_view::npos ? std::string_view{} : line.substr(begin);
}

/// The last line before `index` that is neither blank nor a comment; `index` is set to it.
std::string_view line_above(const Reading& reading, std::size_t& index) {
    while (index > 0) {
        const std::string_view line = without_indentation(reading.line(--index));
        if (!line.empty() && line[0] != '#') return line;
    }
    return {};
}

/// What a key that fits nowhere may come from: a second colon in unquoted text, or a colon or
/// a blank that is missing on the line above.
std::string colon_hint(const Reading& reading, const YAML::Mark& mark) {
    auto index = static_cast<std::size_t>(mark.line);
    const std::string_view line = reading.line(index);
    if (line.substr(0, static_cast<std::size_t>(mark.column)).find(": ") != std::string_view::npos)
        return "put the text after the first colon in quotes";
    const std::string_view above = line_above(reading, index);
    const std::string where = "on line " + std::to_string(index + 1) + ": ";
    if (const auto apart = with_blank_after_colon(above)) return where + blank_hint(*apart);
    if (!above.empty() && above.find_first_of(":[]{}\"'") == std::string_view::npos &&
        !above.starts_with('-'))
        return where + "is a colon missing after " + in_quotes(above) + "?";
    return kLookAround;
}

/// Reports text that is no YAML.
void refuse_broken(const Reading& reading, const YAML::Exception& fault) {
    const std::string cannot = "this cannot be read as YAML: ";
    YAML::Mark mark = fault.mark;
    if (!mark.is_null() && mark.line >= 0) {
        if (const auto tab =
                tab_of_indentation(reading.line(static_cast<std::size_t>(mark.line)))) {
            mark.column = static_cast<int>(*tab);
            reading.error(mark, cannot + "a tab stands here; YAML takes spaces only",
                          "put spaces in place of the tabs before the text");
            return;
        }
        if (fault.msg == "illegal map value" || fault.msg == "end of map not found") {
            reading.error(mark, cannot + in_plain_words(fault.msg), colon_hint(reading, mark));
            return;
        }
    }
    reading.error(mark, cannot + in_plain_words(fault.msg), kLookAround);
}

std::string noun_of(const Reading& reading) {
    return std::string(reading.kind().noun);
}

/// Reports what follows the first document: a second one, or what cannot stand there at all.
void refuse_rest(const Reading& reading, const YAML::Mark& mark) {
    if (reading.at(mark).source_line.starts_with("---"))
        reading.error(mark,
                      "a second document begins here; a " + noun_of(reading) + " is one document",
                      "give each " + noun_of(reading) + " a file of its own");
    else
        reading.error(mark, "this cannot be read as YAML: nothing of the kind can stand here",
                      kLookAround);
}

}  // namespace

std::optional<YAML::Node> read_document(const Reading& reading) {
    if (const auto bad = first_byte_not_text(reading.text())) {
        reading.diagnostics().error(reading.at_byte(*bad), "this is not UTF-8 text",
                                    "save the " + noun_of(reading) + " as plain text in UTF-8");
        return std::nullopt;
    }
    try {
        YAML::Node document = YAML::Load(reading.text());
        std::vector<YAML::Mark> tags;
        const auto second = second_document(reading.text(), tags);
        for (const YAML::Mark& tag : tags)
            reading.error(tag, "tags are not used here", "take out the word that begins with '!'");
        if (second) {
            refuse_rest(reading, *second);
            return std::nullopt;
        }
        if (document.IsDefined() && !document.IsNull()) return document;
        reading.error(YAML::Mark::null_mark(), "the " + noun_of(reading) + " is empty",
                      std::string(reading.kind().example));
    } catch (const YAML::Exception& fault) {
        refuse_broken(reading, fault);
    }
    return std::nullopt;
}

}  // namespace rainledger
