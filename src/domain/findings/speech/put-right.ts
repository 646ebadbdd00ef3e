/** What is said when a slip is put right. */
export const PUT_RIGHT =
  /\b(?:sorry|scratch that|strike that|i tell a lie|tell a lie|make that|no wait|wait no|wait|hang on|hold on|i mean|or rather|correction|my mistake|beg your pardon|excuse me|pardon|oops|whoops|i lied|no no|no it's|no that's|no its|er no|no)\b/;
