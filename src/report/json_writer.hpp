#pragma once

#include <concepts>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

// JSON written as it comes, indented by two blanks.
namespace rainledger {

/// Appends JSON to a string. The caller keeps the grammar: a key before each value in an object,
/// every begin with its end.
class JsonWriter {
public:
    void begin_object() { open('{'); }
    void end_object() { close('}'); }
    void begin_array() { open('['); }
    void end_array() { close(']'); }
    void key(std::string_view name);

    void value(std::string_view text);
    void value(const char* text) { value(std::string_view(text)); }
    /// The shortest text that parses back to the same double; null for infinity and NaN.
    void value(double number);
    void value(std::integral auto number) { raw(std::to_string(number)); }
    void value(bool flag) { raw(flag ? "true" : "false"); }
    void null() { raw("null"); }

    template <class T>
    void value(const std::optional<T>& perhaps) {
        if (perhaps)
            value(*perhaps);
        else
            null();
    }

    template <class T>
    void member(std::string_view name, const T& content) {
        key(name);
        value(content);
    }

    /// The finished text, with a newline at its end.
    [[nodiscard]] std::string take() &&;

private:
    void open(char bracket);
    void close(char bracket);
    void raw(std::string_view text);
    void begin_value();
    void new_line();

    std::string out_;
    std::vector<bool> has_members_;  // one per open bracket
    bool after_key_ = false;
};

/// Appends `text` as a JSON string in quotes: quotes, backslashes and control characters escaped,
/// bytes that are not UTF-8 replaced by U+FFFD.
void append_json_string(std::string& out, std::string_view text);

}  // namespace rainledger
