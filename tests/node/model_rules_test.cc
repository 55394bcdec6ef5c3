#include "harness/node/model_rules.h"

#include <string>
#include <string_view>

#include <gtest/gtest.h>

namespace gatedyno {
namespace {

using std::string_view_literals::operator""sv;

constexpr std::string_view kAllowed[] = {
    "* a comment",
    "* # widths",
    "*",
    "** rule **",
    "* \xc2\xb5m",
    "$ a comment",
    "; a comment",
    "// a comment",
    "+ level=54",
    ".model n nmos level=54",
    ".MODEL n NMOS(level=54)",
    ".model d1 d",
    ".subckt nfet d g s b w=1u",
    ".ends nfet",
    ".param a={b*2}",
    ".func f(x) {x*x}",
    ".if(mc == 1)",
    ".elseif (mc == 2)",
    ".endif",
    ".lib tt",
    ".lib cards/tt.lib tt",
    ".lib \"tt.lib\" tt",
    ".endl tt",
    ".include 'cards/n.inc'",
    ".inc n.inc $ the nfet",
    ".option scale=1e-6",
    ".options tnom = 27 scalm=1",
    ".global vsub",
    "m1 d g s b n w=w l=l",
    "X1 d g s b nfet",
    "rgate g gi 10",
};

TEST(ModelRulesTest, AllowsDefinitions) {
  for (const std::string_view line : kAllowed) {
    EXPECT_EQ(WhyLineRefused(line, true), "") << line;
    EXPECT_EQ(WhyStatementRefused(line), "") << line;
  }
}

struct Refused {
  std::string_view text;
  const char* why;
};

constexpr const char* kCommand =
    "a comment that begins '*#' is a command to the simulator";

constexpr Refused kRefusedLines[] = {
    {".control", "'.control' does not define a device"},
    {".CONTROL", "'.control' does not define a device"},
    {".control x", "'.control' does not define a device"},
    {".controls", "'.controls' does not define a device"},
    {".con", "'.con' does not define a device"},
    {".exec shell ls", "'.exec' does not define a device"},
    {".csparam x=1", "'.csparam' does not define a device"},
    {".measure tran x param=1", "'.measure' does not define a device"},
    {".save all", "'.save' does not define a device"},
    {".tran 1p 1n", "'.tran' does not define a device"},
    {".temp 125", "'.temp' does not define a device"},
    {".incl x.inc", "'.incl' does not define a device"},
    {".libx a b", "'.libx' does not define a device"},
    {".include\"x\"", "'.include\"x\"' does not define a device"},
    {"*#shell ls", kCommand},
    {"*# shell ls", kCommand},
    {"$#shell ls", kCommand},
    {";#shell ls", kCommand},
    {"*;#shell ls", kCommand},
    {"//#shell ls", kCommand},
    {"=#shell ls", "'=' begins no definition"},
    {"%#shell ls", "'%' begins no definition"},
    {"\"#shell ls", "'\"' begins no definition"},
    {"#shell ls", "'#' begins no definition"},
    {"shell ls", "devices 's' are not for model files"},
    {"a1 in out reader", "devices 'a' are not for model files"},
    {"N1 d g s b dev", "devices 'n' are not for model files"},
    {"u1 dff", "devices 'u' are not for model files"},
    {"*\r#shell ls"sv, "control character 0x0d"},
    {".con\rtrol"sv, "control character 0x0d"},
    {"\f#shell ls"sv, "control character 0x0c"},
    {".param x=1\0"sv, "control character 0x00"},
    {"* \x1b[2J"sv, "control character 0x1b"},
    {"* \x7f"sv, "control character 0x7f"},
    {"\xef\xbb\xbf.control",
     "a character outside ASCII, in a line that is no comment"},
    {"*\\", "the backslash at its end may join it with the next line"},
    {".param a=1 \\",
     "the backslash at its end may join it with the next line"},
};

TEST(ModelRulesTest, RefusesTheRest) {
  for (const Refused& refused : kRefusedLines) {
    EXPECT_EQ(WhyLineRefused(refused.text, true), refused.why) << refused.text;
  }
  EXPECT_EQ(WhyLineRefused("+ uic", false),
            "there is nothing that '+' continues");
}

constexpr Refused kRefusedStatements[] = {
    {".model r1 filesource(file=\"/etc/passwd\")",
     "models of type 'filesource' may read and write files"},
    {".model  r1  filesource ",
     "models of type 'filesource' may read and write files"},
    {".model m1 numos", "models of type 'numos' may read and write files"},
    {".model ,nmos (numd", "models of type 'numd' may read and write files"},
    {".model nmos", "it names no type of model"},
    {".option reltol=0.1", "option 'reltol' is not for models to set"},
    {".options scale=1u ngdebug", "option 'ngdebug' is not for models to set"},
    {".options scale = = ngdebug", "option 'ngdebug' is not for models to set"},
    {".option temp=125", "option 'temp' is not for models to set"},
    {".include a b", "'b' is too much on its line"},
    {".include \"a b\"",
     "'a b' has other characters than letters, digits and _.+-/"},
    {".include ~/x",
     "'~/x' has other characters than letters, digits and _.+-/"},
    {".include x;/../y",
     "'x;/../y' has other characters than letters, digits and _.+-/"},
    {".include $HOME/x",
     "'$HOME/x' has other characters than letters, digits and _.+-/"},
    {".lib a.lib $tt",
     "'$tt' has other characters than letters, digits and _.+-/"},
    {".lib a.lib ; tt",
     "';' has other characters than letters, digits and _.+-/"},
    {".lib a.lib tt $ words", "'$ words' is too much on its line"},
};

TEST(ModelRulesTest, RefusesStatements) {
  for (const Refused& refused : kRefusedStatements) {
    EXPECT_EQ(WhyLineRefused(refused.text, true), "") << refused.text;
    EXPECT_EQ(WhyStatementRefused(refused.text), refused.why) << refused.text;
  }
}

}  // namespace
}  // namespace gatedyno
